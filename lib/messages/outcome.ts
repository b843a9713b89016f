import { demandWords } from './demand'
import { plural } from './plural'
import { writtenDay, writtenNumber, writtenPercent } from './written'

const days = (count: number) => plural(Math.abs(count), { one: '# day', other: '# days' })

/** A run held against what was thought of it, and the record of all runs. */
export const outcomeWords = {
  title: 'Outcome',
  lead: 'What was thought, what came, and what the next run will believe because of it.',
  forecasts: 'Forecast against outcome',
  noForecasts: 'No forecast was kept: they are written down as each quarter of the time for deposits ends.',
  decidedWith: (units: number, minimum: number) =>
    `Decided with ${writtenNumber(units)} under deposit; the minimum was ${writtenNumber(minimum)}.`,
  undecided: 'Not decided yet: whether the forecasts held is not known.',
  quarter: 'Part of the time gone',
  quarterOf: (quarter: number) => writtenPercent(quarter / 4),
  when: 'When',
  deposited: 'Under deposit',
  expected: 'Expected',
  range: '8 of 10 cases',
  rangeOf: (low: number, high: number) => `${writtenNumber(low)} to ${writtenNumber(high)}`,
  chance: 'Reaches the minimum',
  held: 'Held',
  heldOf: (held: boolean | null) => (held === null ? 'not known yet' : held ? 'yes' : 'no'),
  tenth: demandWords.tenth,
  offer: 'Offer',
  offers: demandWords.offers,
  classes: demandWords.classes,
  seenOf: demandWords.seenOf,

  units: 'Units',
  paid: 'Paid',
  lapsed: 'Lapsed',
  cancelled: 'Cancelled',
  withdrawn: 'Withdrawn',
  open: 'Still to be paid',
  likelyToPay: 'Expected to be paid, at the lock',

  dates: 'Planned and actual dates',
  promisedBy: 'First promised by',
  postedOn: 'Last one posted on',
  notPosted: 'not all posted yet',
  difference: 'Difference',
  daysLate: (late: number | null) =>
    late === null ? '–' : late === 0 ? 'on the day' : late > 0 ? `${days(late)} late` : `${days(late)} early`,

  money: 'Cost and yield',
  plannedCost: 'Planned cost of the units paid',
  actualCost: 'Actual cost',
  costDifference: 'Difference',
  plannedYield: 'Planned yield',
  actualYield: 'Actual yield',
  yieldOf: (good: number, started: number) =>
    started === 0
      ? 'nothing put into work'
      : `${writtenPercent(good / started)} (${writtenNumber(good)} of ${writtenNumber(started)})`,
  received: 'Taken from buyers',
  refunded: 'Paid back',
  notKnown: 'not known',
  notTyped: 'not entered yet',
  actualsTitle: 'What it really cost',
  actualsHint:
    'Typed by you at the close; typing it again corrects it. Bills paid in other currencies, as booked.',
  costLabel: 'Everything it cost',
  startedLabel: 'Boards put into work',
  goodLabel: 'Boards that came out good',
  save: 'Keep these figures',

  learned: 'What the next run will believe',
  learnedNone: 'Stored when the run is closed.',
  class: 'Who',
  seen: 'In this run',
  before: 'Believed before',
  after: 'Believed now',

  decisions: 'Every decision, as it was taken',
  decisionKinds: {
    open_deposits: 'Opened for deposits',
    lock: 'Locked',
    call_off: 'Called off',
    lower_minimum: 'Minimum lowered',
    move_decide_by: 'Decide-by moved',
    change_maximum: 'Maximum changed',
    delay_offer: 'Offer delayed',
    close: 'Closed',
  } as Record<string, string>,
  byClock: 'by the clock',
  frozen: 'The figures as they stood then',
  version: (version: string) => `version ${version} of the calculations`,
  changed: ({ from, to }: { from: string; to: string }, kind: string) =>
    kind === 'move_decide_by' ? `${writtenDay(from)} to ${writtenDay(to)}` : `${from} to ${to}`,
  waivers: 'Let pass, with reasons',

  recordTitle: 'Track record',
  recordLead: 'What your runs have shown so far, and how good the forecasts were.',
  conversions: 'Who orders, who pays',
  conversionsNone: 'No run has been closed yet. What became of its people is stored then.',
  share: 'Share, 95 % interval',
  shareOf: (converted: number, asked: number, low: number, high: number) =>
    `${writtenPercent(converted / asked)} (${writtenPercent(low)} to ${writtenPercent(high)})`,
  of: (converted: number, asked: number) => `${writtenNumber(converted)} of ${writtenNumber(asked)}`,
  count: 'Of how many',
  scored: 'Forecasts scored',
  scoredNone: 'No forecast of a decided run was kept yet.',
  scoredSentence: (held: number, stated: number, brier: number) =>
    `${writtenNumber(held)} of ${writtenNumber(stated)} ranges held what came; 8 of 10 should. Brier score of the chance to reach the minimum: ${writtenNumber(brier, { digits: 2 })} (0 is best, always saying one half scores 0.25).`,
  stated: 'Chance stated',
  statedOf: (from: number, to: number) => `${writtenPercent(from)} to ${writtenPercent(to)}`,
  times: 'Times',
  meanChance: 'Stated on average',
  came: 'Came true',
  runs: 'Run by run',
  runsNone: 'No run has been opened yet.',
  run: 'Run',
  yield: 'Yield',
  posted: 'Posted',
  ofMinimum: (units: number | null, minimum: number) =>
    units === null ? '–' : `${writtenNumber(units)} of ${writtenNumber(minimum)}`,
}
