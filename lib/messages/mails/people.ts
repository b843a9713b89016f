import { plural } from '@/lib/messages/plural'

export const signInLink = {
  subject: 'Your sign-in link',
  lead: (minutes: number) =>
    `Use this link to sign in. It works once, within ${plural(minutes, { one: '# minute', other: '# minutes' })}.`,
  action: 'Sign in',
  notYou: 'If you did not ask for it, do nothing: nobody can sign in without this mail.',
}

const roles = {
  owner: 'an owner of the workshop',
  bench: 'a helper at the bench, for test plans, units and results',
  packer: 'a helper who packs, for the packing queue, papers and parcels',
} as const

export const staffInvitation = {
  subject: (workshop: string) => `You are invited to work with ${workshop}`,
  lead: (by: string, workshop: string, role: keyof typeof roles) =>
    `${by} invites you to ${workshop} as ${roles[role]}.`,
  action: 'Accept the invitation',
  until: (day: string) => `The link works until ${day}. If you do not know the sender, do nothing.`,
}

export const ownerReminder = {
  decideSubject: (module: string, number: number, on: string) => `${module}, run ${number}: decide by ${on}`,
  postedSubject: (module: string, number: number, on: string) =>
    `${module}, run ${number}: promised by ${on}`,
  decide: (on: string, daysLeft: number, deposited: number, minimum: number) =>
    `${daysLeft >= 0 ? `The run is to be decided by ${on}` : `The run was to be decided by ${on}`}: ${deposited} of ${minimum} under deposit.`,
  posted: (offer: string, on: string, daysLeft: number) =>
    `You have promised to post ${offer} by ${on}: ${plural(Math.max(0, daysLeft), { one: '# day', other: '# days' })} left, and not all is posted.`,
  callsOff: (day: string) =>
    `Lock it or call it off. Undecided, it calls itself off on ${day}, and everyone is paid back.`,
  tellFirst:
    'If it cannot be kept, tell your buyers before it passes; they may wait or cancel free of charge.',
  action: 'Open the run',
}

export const ownerDigest = {
  subject: (workshop: string, n: number) =>
    `${workshop}: ${plural(n, { one: '# thing needs', other: '# things need' })} you`,
  lead: (day: string) => `What stands at your desk on ${day}:`,
  items: {
    signups: (n: number) => plural(n, { one: '# new confirmed sign-up', other: '# new confirmed sign-ups' }),
    deposits: (n: number) => plural(n, { one: '# new deposit', other: '# new deposits' }),
    cancellations: (n: number) => plural(n, { one: '# order cancelled', other: '# orders cancelled' }),
    decide_soon: (n: number) =>
      plural(n, { one: '# run to decide within a week', other: '# runs to decide within a week' }),
    ready_to_lock: (n: number) => plural(n, { one: '# run ready to lock', other: '# runs ready to lock' }),
    balances_failed: (n: number) =>
      plural(n, { one: '# balance waiting for its buyer', other: '# balances waiting for their buyers' }),
    problems_open: (n: number) => plural(n, { one: '# problem to answer', other: '# problems to answer' }),
    notices_due: (n: number) => plural(n, { one: '# delay notice due', other: '# delay notices due' }),
    quotes_old: (n: number) =>
      plural(n, { one: '# part with an old quote', other: '# parts with an old quote' }),
    refunds_waiting: (n: number) => plural(n, { one: '# refund waiting', other: '# refunds waiting' }),
    parcels_ready: (n: number) => plural(n, { one: '# parcel to pack', other: '# parcels to pack' }),
    mails_bounced: (n: number) =>
      plural(n, { one: '# mail that did not arrive', other: '# mails that did not arrive' }),
    parts_late: (n: number) => plural(n, { one: '# delivery late', other: '# deliveries late' }),
    disputes: (n: number) => plural(n, { one: '# disputed payment', other: '# disputed payments' }),
  },
  action: 'Open your desk',
  settings: 'How often this mail comes',
}
