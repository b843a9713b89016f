import { plural } from './plural'

/** An owner's desk: its navigation and what needs doing today. */
export const deskWords = {
  today: 'Today',
  modules: 'Modules',
  runs: 'Runs',
  money: 'Money',
  settings: 'Settings',
  packing: 'Packing',
  titleOf: (workshop: string) => `${workshop}: today`,
  lead: 'What needs you, and how far each run is. The same list comes by mail in the evening, when there is one.',
  pendingTitle: 'Waiting for the host',
  pending:
    'The host of this site looks at each workshop before it opens. Until then you can enter and preview everything; publishing comes after.',
  suspendedTitle: 'Suspended',
  suspended:
    'No new orders are taken. Refunds, cancellations, notices and buyers’ pages go on. Write to the host of this site.',
  stepsTitle: 'Your first module in ten minutes',
  stepsLead: 'In any order; each line leads to where it is done.',
  stepsLeft: (count: number) => plural(count, { one: '# step to go', other: '# steps to go' }),
  stepsDone: 'Everything is in place for a run.',
  steps: {
    account: 'Connect your payment account',
    details: 'Enter who you are and your postal address',
    terms: 'Publish your terms',
    postage: 'Enter what the post costs',
    module: 'Begin a module',
    offers: 'Enter its offers: price, deposit, weight',
    revision: 'Begin a revision',
    first_unit: 'Record its first good unit',
    plan: 'Enter the cost plan and the schedule',
    packer: 'Invite somebody who packs',
    publish: 'Publish the module',
  },
  stepHints: { packer: 'You can pack yourself; then leave this open.' },
  stepDone: 'done',
  stepOpen: 'to do',
  runsTitle: 'Runs that are going',
  run: 'Run',
  state: 'State',
  runStates: { draft: 'draft', taking_deposits: 'taking deposits', locked: 'locked' },
  places: 'Places taken or held',
  placesOf: (taken: number, minimum: number, maximum: number) =>
    `${taken} of ${minimum} (${maximum} at most)`,
  decideBy: 'Decide by',
  noRuns: 'No run is going. Begin one once the module is ready.',
  newRun: 'Begin a run',
} as const
