import { countryName } from '@/lib/core/data/country'
import { plural } from './plural'
import { writtenDay, writtenNumber, writtenPercent } from './written'

type Buckets = {
  step: 'day' | 'week' | 'month'
  buckets: readonly { from: string; people: number }[]
}
type Expected = {
  total: { mean: number; low: number; high: number; chance: number }
  run: { minimum: number; decideBy: string }
  daysLeft: number
}
type MadeOf = {
  deposited: number
  fromListed: number
  fromNewcomers: number
  newcomers: { seen: number; days: number }
  arrivedBy: number
  learnedFrom: number
}
type Invitations = { sent: number; ordered: number; declined: number; expired: number }

const people = (count: number) => plural(count, { one: '# person', other: '# people' })
const units = (count: number) => plural(count, { one: '# unit', other: '# units' })
const tenth = (count: number) => writtenNumber(Math.round(count * 10) / 10, { digits: 1 })

/** Interest in a module, and what a run may expect of it. */
export const demandWords = {
  title: 'Demand',
  interest: 'Interest',
  interestLead: 'Confirmed sign-ups, counted. Who they are does not matter here.',
  lead: 'What to expect, where that comes from, and how sure it is.',
  none: 'Nobody has signed up yet. The module’s page asks; share its address.',
  overTime: 'Sign-ups over time',
  overTimeSentence: ({ step, buckets }: Buckets) => {
    const most = buckets.reduce((top, each) => (each.people > top.people ? each : top), buckets[0]!)
    const last = buckets.at(-1)!
    const when = { day: 'day', week: 'week', month: 'month' }[step]
    return `${people(buckets.reduce((sum, each) => sum + each.people, 0))} by the ${when}; most in the ${when} of ${writtenDay(most.from)} (${writtenNumber(most.people)}), ${writtenNumber(last.people)} in the last.`
  },
  people: 'People',
  units: 'Units',
  total: (of: { people: number; units: number }) => `${people(of.people)}, ${units(of.units)}`,
  byOffer: 'By offer',
  byCertainty: 'By how sure',
  byCountry: 'By country',
  byPrice: 'By highest price stated',
  byChoice: 'Choices under deposit',
  answer: 'Answer',
  offers: { boards: 'PCB and front panel set', kit: 'kit', built: 'built and tested' } as Record<
    string,
    string
  >,
  classes: {
    certain: 'certain',
    likely: 'likely',
    curious: 'curious',
    oldSignUp: 'signed up over 90 days before',
    depositHolder: 'under deposit: pays the rest',
  },
  country: (code: string) => (code === '' ? 'all others' : countryName(code)),
  notAsked: 'not asked',

  forecast: 'What to expect',
  forecastOver: 'Nothing more is expected: the run is decided, or its decide-by day has passed.',
  forecastSentence: ({ total, run, daysLeft }: Expected) =>
    `${writtenNumber(Math.round(total.mean))} units in the end, in 8 of 10 cases ${writtenNumber(total.low)} to ${writtenNumber(total.high)}; ${writtenPercent(total.chance)} likely to reach the minimum of ${writtenNumber(run.minimum)} by ${writtenDay(run.decideBy)} (${plural(daysLeft, { one: '# day', other: '# days' })} left).`,
  offer: 'Offer',
  deposited: 'Under deposit',
  expected: 'Expected in the end',
  range: '8 of 10 cases',
  rangeOf: (low: number, high: number) => `${writtenNumber(low)} to ${writtenNumber(high)}`,
  all: 'together',
  tenth,
  madeOf: ({ deposited, fromListed, fromNewcomers, newcomers, arrivedBy, learnedFrom }: MadeOf) => [
    `${units(deposited)} under deposit, ${tenth(fromListed)} more from people on the list who have not answered, ${tenth(fromNewcomers)} from people on no list.`,
    `By this part of the time ${writtenPercent(arrivedBy)} of the deposits are usually in (${learnedFrom === 0 ? 'our own starting curve: no earlier run of yours has deposits yet' : `taught by ${plural(learnedFrom, { one: '# deposit', other: '# deposits' })} of your earlier runs`}). Whoever was invited and is still silent counts for less the later it is.`,
    newcomers.days < 7
      ? 'How many people come who are on no list is not said before everyone has been able to order for a week, here or in an earlier run.'
      : `${people(newcomers.seen)} on no list came in ${plural(newcomers.days, { one: '# day', other: '# days' })}; those still to come are counted at that pace, the rush of the first days set aside.`,
    'Sign-ups that were over 90 days old when they were invited count as a class of their own.',
  ],
  beliefs: 'Where it comes from',
  beliefsLead:
    'The starting values are ours: common practice, no source. Your closed runs and those who have answered in this one correct them.',
  class: 'Who',
  starting: 'Starts from',
  seen: 'Your closed runs',
  seenOf: ({ converted, notConverted }: { converted: number; notConverted: number }) =>
    converted + notConverted === 0
      ? 'nothing yet'
      : `${writtenNumber(converted)} of ${writtenNumber(converted + notConverted)}`,
  here: 'This run',
  hereOf: ({ ordered, declined, silent }: { ordered: number; declined: number; silent: number }) =>
    `${writtenNumber(ordered)} ordered, ${writtenNumber(declined)} not, ${writtenNumber(silent)} silent`,
  believed: 'Believed now',
  believedOf: ({ mean, low, high }: { mean: number; low: number; high: number }) =>
    `${writtenPercent(mean)} (${writtenPercent(low)} to ${writtenPercent(high)})`,
  needed: 'How many more sign-ups',
  neededLead: 'To make the minimum as sure as four in five, with one unit each; people on no list left out.',
  neededOf: (name: string, more: number | 'already_there' | 'out_of_reach') =>
    more === 'already_there'
      ? `${name}: none, it is sure enough`
      : more === 'out_of_reach'
        ? `${name}: more than a thousand`
        : `${name}: ${writtenNumber(more)} more`,
  invitations: 'Invitations',
  invitationsOf: ({ sent, ordered, declined, expired }: Invitations) =>
    sent === 0
      ? 'Nobody has been invited yet.'
      : `${writtenNumber(sent)} sent: ${writtenNumber(ordered)} ordered, ${writtenNumber(declined)} declined, ${writtenNumber(expired)} ended unanswered, ${writtenNumber(sent - ordered - declined - expired)} open.`,
  prices: (offer: string) => `Along the price list: ${offer}`,
  pricesLead:
    'What would be wanted, and earned, at each price people stated, the other offers at theirs. Stated prices run high; nothing is claimed above the highest.',
  price: 'Price',
  members: 'Would still join',
  chance: 'Reaches the minimum',
  profit: 'Expected profit',
  best: 'best',
  notKnown: 'not known',
  csv: { what: 'What', answer: 'Answer', people: 'People', units: 'Units' },
}
