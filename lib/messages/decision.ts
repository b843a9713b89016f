import { formatMoney } from '@/lib/core/money/format'
import { plural } from './plural'
import { writtenNumber, writtenPercent } from './written'

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
  /** Readiness lines neither ready nor waived. */
  notReady: number
}

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
