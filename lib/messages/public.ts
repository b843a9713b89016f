import { plural } from './plural'
import { writtenDay, writtenNumber } from './written'

const units = (count: number) => plural(count, { one: '# unit', other: '# units' })
const days = (count: number) => plural(count, { one: '# day', other: '# days' })

/** The forms in which a module is sold, as buyers read them. */
export const offerWords = {
  boards: 'PCB and front panel set',
  kit: 'Kit',
  built: 'Built and tested',
} as const

/** The public pages: front, workshop, module. */
export const publicWords = {
  account: 'Your account',
  workshopsTitle: 'Workshops',
  modulesTitle: 'Modules',
  frontTitle: 'Small runs of rack-mounted modules, made when enough people want one',
  frontLead:
    'Makers show what they have built. You say that you would like one. When enough deposits are in by the date on the page, the run is built; if not, everyone is paid back in full.',
  howTitle: 'How a run fills',
  how: [
    [
      'You say you would like one',
      'Registering interest is free and binds nobody. The maker learns how many to plan for, in which form and where to.',
    ],
    [
      'Deposits open',
      'Those who registered are invited first. A deposit takes a place; until the decision you can cancel and get all of it back.',
    ],
    [
      'The run fills to the brim, or not',
      'With enough units under deposit by the decide-by date the maker can lock the run. Otherwise every deposit is paid back.',
    ],
    [
      'It is built and posted',
      'You see how far it is, pay the balance when it falls due, and get your parcel. If a date cannot be kept, you are told before it passes.',
    ],
  ] as const,
  makersTitle: 'You make modules',
  makersLead:
    'Find out how many people mean it, what a run costs at each quantity, and take deposits you can pay back, on your own payment account.',
  startWorkshop: 'Start a workshop',
  noModules: 'No module is shown here yet. When a workshop publishes one, it stands here.',
  noWorkshops: 'No workshop is open here yet.',
  by: (workshop: string) => `by ${workshop}`,
  modulesOf: (count: number) =>
    count === 0 ? 'no module yet' : plural(count, { one: '# module', other: '# modules' }),
  gathering: 'Gathering interest.',
  beingMade: (deposited: number) => `Locked and being made, ${units(deposited)} under deposit.`,
  workshopModules: 'Modules',
  suspendedTitle: 'Nothing new is taken here',
  suspended:
    'The host of this site has paused this workshop. Orders already placed go on: cancelling, paying back and writing to you all work as before.',

  happeningTitle: 'Is it happening?',
  interest: (confirmed: number, wanted: number) =>
    confirmed === 0
      ? 'Nobody has registered interest yet. You can be the first.'
      : `${plural(confirmed, { one: 'One person has', other: '# people have' })} said they would like one; ${units(wanted)} in all.`,
  interestHidden: 'People are registering interest. The maker shows how many once there are ten.',
  noRun: 'No run is open for deposits yet. Those who register are invited first when one opens.',
  decideBy: 'Decided by',
  opensToAll: 'Open to everyone from',
  headStart: 'Until then only people who registered interest and were invited can order.',
  minimum: 'Minimum',
  maximum: 'Maximum',
  held: 'Being paid right now',
  waiting: 'Waiting',
  revision: 'Revision',
  lockedOn: 'Locked on',
  postedBy: 'Posted by',
  postedByOffer: (offer: string) => `Posted by (${offer})`,
  limit: 'At most per person',
  lastDayPassed:
    'The last day for deposits has passed. The maker decides now; without a decision everyone is paid back.',
  locked: (deposited: number) =>
    `The run is locked with ${units(deposited)} under deposit and is being made. No more orders are taken for it.`,
  silent: (count: number) => `No news for ${days(count)}`,
  silentWords: 'The maker has not written to buyers for thirty days or more since the run was locked.',
  orderFrom: (deposit: string) => `Order with a deposit from ${deposit}`,
  joinWaiting: 'Join the waiting list',
  register: 'Register interest, free of charge',
  registerToo: 'Not yet? Register interest',
  priceFrom: (price: string) => `From ${price}`,
  priceOpen: 'The price is still open.',

  costTitle: 'What it costs',
  contents: (offer: string) => `What is in it: ${offer}`,
  surcharge: (label: string, sum: string) => `${label} (+ ${sum})`,
  choices: 'You choose',

  moneyTitle: 'What happens to your money',
  moneyInterest:
    'Registering interest costs nothing and commits you to nothing. When deposits open, this is how it goes:',
  money: {
    deposit:
      'You pay the deposit by card, straight to the workshop’s own account at the payment provider. It is part of the price and takes your place.',
    untilDecision:
      'Until the decision you can cancel with two clicks and get all of it back. Deposits stay where they can be paid back from; they are not paid out to the maker before the run is locked.',
    decision: (minimum: number, decideBy: string) =>
      `With ${units(minimum)} under deposit by ${writtenDay(decideBy)} the maker can lock the run. If the run does not go ahead, every deposit is paid back in full; without a decision seven days later that happens by itself.`,
    decisionLater:
      'Each run has a minimum and a decide-by date. If the run does not go ahead, every deposit is paid back in full.',
    balance: {
      at_lock:
        'The balance falls due when the run is locked. You are told the sum, the day and the card at least seven days before.',
      units_passed:
        'The balance falls due when your units have passed their tests. You are told the sum, the day and the card at least seven days before.',
      before_packing:
        'The balance falls due before packing. You are told the sum, the day and the card at least seven days before.',
      later:
        'The balance falls due later, as the run says. You are told the sum, the day and the card at least seven days before.',
    },
    after:
      'After the lock, consumers in the EU and the UK may withdraw at any time until 14 days after the last piece arrived and get everything back, the deposit and standard postage included. For everyone else the workshop’s terms apply.',
    promise:
      'If the date by which it is posted cannot be kept, you are told before it passes and can wait or cancel for a full refund.',
  },
  cautionsTitle: 'Before you build or use it',
  cautionsOffer: (offers: string) => `Cautions: ${offers}`,
  age: (years: number) => `Meant for people of ${writtenNumber(years)} and older.`,
  cautionsLocal:
    'Safety, radio interference and waste rules differ by country. This page is no legal advice; ask locally if you are unsure.',
  termsTitle: 'Terms',
  termsOf: (number: number, day: string) => `Version ${number}, ${writtenDay(day)}`,
  termsRead: 'Read the terms of this workshop',
  noTerms: 'The workshop has not published its terms yet; deposits cannot open before it has.',
  specificationTitle: 'Specification',
  width: 'Width',
  widthHp: (hp: number) => `${hp} HP`,
  depth: 'Depth behind the front panel',
  depthMm: (mm: number) => `${mm} mm`,
  rail: { plus12: '+12 V', minus12: '−12 V', plus5: '+5 V' },
  milliamperes: (value: number) => `${value} mA`,
  storyTitle: 'What it does',
  video: 'Watch the video (leads to another site)',
  makerTitle: 'Who makes it',
  trader: 'Trader',
  address: 'Address',
  email: 'E-mail',
  phone: 'Telephone',
  taxNumber: 'Tax number',
  aboutMaker: (workshop: string) => `All modules of ${workshop}`,
  recordTitle: 'Earlier runs',
  noRecord: 'No run of this workshop has ended yet.',
  record,
  sheetWhat: (module: string) => `${module}, public page`,
} as const

type PublicRecord = { daysLate: readonly number[]; repaidInDays: readonly (number | null)[] }

/**
 * Earlier runs in one sentence.
 * @example record({ daysLate: [-4, 19], repaidInDays: [3] })  // → '3 runs: posted 4 days early, 19 days late, 1 called off, all repaid in 3 days.'
 */
function record({ daysLate, repaidInDays }: PublicRecord): string {
  const runs = daysLate.length + repaidInDays.length
  const posted = daysLate.map((late) =>
    late === 0 ? 'on the day' : late < 0 ? `${days(-late)} early` : `${days(late)} late`,
  )
  const parts = [
    ...(posted.length > 0 ? [`posted ${posted.join(', ')}`] : []),
    ...(repaidInDays.length > 0 ? [`${repaidInDays.length} called off`, repaid(repaidInDays)] : []),
  ]
  return `${plural(runs, { one: '# run', other: '# runs' })}: ${parts.join(', ')}.`
}

function repaid(repaidInDays: readonly (number | null)[]): string {
  const known = repaidInDays.filter((each) => each !== null)
  if (known.length < repaidInDays.length) return 'not everyone repaid yet'
  const longest = Math.max(...known)
  return longest === 0 ? 'all repaid the same day' : `all repaid in ${days(longest)}`
}
