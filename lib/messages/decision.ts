import { formatMoney } from '@/lib/core/money/format'
import { plural } from './plural'
import { writtenDay, writtenNumber, writtenPercent } from './written'

type Facts = {
  state: 'draft' | 'taking_deposits' | 'locked' | 'closed' | 'called_off'
  currency: string
  locale: string
  minimum: number
  maximum: number
  figures: {
    deposited: number
    forecast: { chance: number }
    breakEven: number | null
    expectedProfitMinor: number | null
    chanceOfLoss: number | null
  }
  weighed: {
    likelyToPay: number
    worstInTenMinor: number | null
    tenthFails: { units: number; profitMinor: number } | null
    cashLow: { units: number; lowMinor: number; on: string | null } | null
  }
  /** Readiness lines neither ready nor waived. */
  notReady: number
}

const units = (count: number) => plural(count, { one: '# unit', other: '# units' })

const lines = (count: number) => plural(count, { one: '# line', other: '# lines' })

/** The verdict over a run: one heading, and the sentence that says what it rests on. */
export const decision = {
  title: 'Where the run stands',
  verdict(facts: Facts): { kind: 'done' | 'attention' | 'stopped' | 'plain'; title: string; words: string } {
    const { state, figures, minimum, notReady } = facts
    if (state === 'called_off')
      return { kind: 'stopped', title: 'Called off', words: 'This run will not be built.' }
    if (state === 'closed') return { kind: 'done', title: 'Closed', words: 'Everything of this run is done.' }
    if (state === 'locked')
      return {
        kind: 'done',
        title: 'Locked',
        words: 'The run goes ahead. These are the figures as they stand today.',
      }
    if (state === 'draft')
      return { kind: 'plain', title: 'Not open yet', words: 'Nobody sees this run before you open it.' }
    const left = minimum - figures.deposited
    if (left > 0)
      return {
        kind: 'attention',
        title: 'Not enough yet',
        words: `${plural(left, { one: '# unit', other: '# units' })} under deposit missing to the minimum; ${writtenPercent(figures.forecast.chance)} likely to be reached.`,
      }
    if ((figures.chanceOfLoss ?? 0) > 0.5)
      return {
        kind: 'stopped',
        title: 'It would probably lose money',
        words: 'The minimum is reached, but at this mix of offers a loss is likelier than not.',
      }
    if (notReady > 0)
      return {
        kind: 'attention',
        title: 'Enough deposits, not ready',
        words: `The minimum is reached; ${lines(notReady)} of the readiness list still stand open.`,
      }
    return { kind: 'done', title: 'It can go', words: 'The minimum is reached and everything is ready.' }
  },
  /** The three figures that carry the verdict. */
  figures({ figures, minimum, maximum, currency, locale }: Facts): { name: string; value: string }[] {
    const { deposited, breakEven, expectedProfitMinor, chanceOfLoss } = figures
    return [
      {
        name: 'Under deposit',
        value: `${writtenNumber(deposited)} of ${writtenNumber(minimum)}, at most ${writtenNumber(maximum)}`,
      },
      {
        name: 'No loss from',
        value:
          expectedProfitMinor === null
            ? 'not known without a cost plan'
            : breakEven === null
              ? `no quantity up to ${writtenNumber(maximum)}`
              : plural(breakEven, { one: '# unit', other: '# units' }),
      },
      {
        name: 'Expected profit',
        value:
          expectedProfitMinor === null
            ? 'not known without a cost plan'
            : `${formatMoney(expectedProfitMinor, currency, locale)}; ${writtenPercent(chanceOfLoss ?? 0)} likely to lose`,
      },
    ]
  },
  /** The sentence the verdict rests on: who is likely to pay, from where on nothing is lost, how the worst in ten ends. */
  carried({ figures, weighed, currency, locale }: Omit<Facts, 'notReady'>): string {
    const { deposited, breakEven } = figures
    const { likelyToPay, worstInTenMinor: worst } = weighed
    const paid =
      deposited === 0
        ? 'Nobody is under deposit yet'
        : `${writtenNumber(Math.round(likelyToPay))} of ${writtenNumber(deposited)} under deposit are likely to pay`
    const even =
      worst === null
        ? 'without a cost plan nothing is known about profit'
        : breakEven === null
          ? 'at this mix every quantity loses'
          : `break-even at this mix is ${writtenNumber(breakEven)}`
    const end =
      worst === null
        ? ''
        : worst < 0
          ? `; the worst in ten loses ${formatMoney(-worst, currency, locale)}`
          : `; even the worst in ten leaves ${formatMoney(worst, currency, locale)}`
    return `${paid}; ${even}${end}.`
  },
  /** What else is weighed in money; empty without a cost plan. */
  weighedFacts({ weighed, currency, locale }: Pick<Facts, 'weighed' | 'currency' | 'locale'>) {
    const money = (minor: number) => formatMoney(minor, currency, locale)
    const { worstInTenMinor, tenthFails, cashLow } = weighed
    return [
      ...(worstInTenMinor === null
        ? []
        : [{ name: 'Nine of ten cases leave at least', value: money(worstInTenMinor) }]),
      ...(tenthFails === null
        ? []
        : [
            {
              name: 'If 10 % do not pay',
              value:
                tenthFails.profitMinor < 0
                  ? `you lose ${money(-tenthFails.profitMinor)} at ${units(tenthFails.units)}`
                  : `you still make ${money(tenthFails.profitMinor)} at ${units(tenthFails.units)}`,
            },
          ]),
      ...(cashLow === null
        ? []
        : [
            {
              name: `Lowest point of the money, at ${units(cashLow.units)}`,
              value:
                cashLow.lowMinor >= 0 || cashLow.on === null
                  ? 'never below zero'
                  : `${money(cashLow.lowMinor)} on ${writtenDay(cashLow.on)}`,
            },
          ]),
    ]
  },
  /** What the forecast is made of. */
  madeOf(
    { fromListed, fromNewcomers, silent }: { fromListed: number; fromNewcomers: number; silent: number },
    daysLeft: number,
  ) {
    const about = (count: number) => writtenNumber(Math.round(count * 10) / 10, { digits: 1 })
    const invited =
      silent === 0
        ? 'Nobody invited is still silent'
        : `${plural(silent, { one: '# person was invited and has', other: '# people were invited and have' })} not answered`
    return `${invited}; with ${plural(daysLeft, { one: '# day', other: '# days' })} left, people on the list are worth ${about(fromListed)} more units, people on no list ${about(fromNewcomers)}. The longer somebody is silent, the less is expected of them.`
  },
  profitNote:
    'Counted over go and call-off together, on orders expected to be paid: deposits are not payments.',
  mixOf: {
    deposits: 'At the mix of offers under deposit.',
    signups: 'At the mix of offers signed up for, while nobody is under deposit.',
    even: 'At an even mix of the offers, while nobody has signed up.',
  },
  noPlan:
    'There is no cost plan that knows the offers of this run, so profit and units to build are not known.',
  toPlan: 'Enter the cost plan',
  starts: (count: number) => plural(count, { one: '# board', other: '# boards' }),
  repay: {
    yes: 'yes',
    short: (sum: string) => `short by ${sum}`,
    unknown: 'not known: the payment provider did not answer',
  },
}
