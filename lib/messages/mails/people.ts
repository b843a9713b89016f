import { counted } from '@/lib/messages/mails/words'

export const signInLink = {
  subject: 'Your sign-in link',
  lead: (minutes: number) =>
    `Use this link to sign in. It works once, within ${counted(minutes, 'minute', 'minutes')}.`,
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

export const ownerDigest = {
  subject: (workshop: string, n: number) => `${workshop}: ${counted(n, 'thing needs', 'things need')} you`,
  lead: (day: string) => `What stands at your desk on ${day}:`,
  items: {
    signups: (n: number) => counted(n, 'new confirmed sign-up', 'new confirmed sign-ups'),
    deposits: (n: number) => counted(n, 'new deposit', 'new deposits'),
    cancellations: (n: number) => counted(n, 'order cancelled', 'orders cancelled'),
    decide_soon: (n: number) => counted(n, 'run to decide within a week', 'runs to decide within a week'),
    ready_to_lock: (n: number) => counted(n, 'run ready to lock', 'runs ready to lock'),
    balances_failed: (n: number) =>
      counted(n, 'balance waiting for its buyer', 'balances waiting for their buyers'),
    problems_open: (n: number) => counted(n, 'problem to answer', 'problems to answer'),
    notices_due: (n: number) => counted(n, 'delay notice due', 'delay notices due'),
    quotes_old: (n: number) => counted(n, 'part with an old quote', 'parts with an old quote'),
    refunds_waiting: (n: number) => counted(n, 'refund waiting', 'refunds waiting'),
    parcels_ready: (n: number) => counted(n, 'parcel to pack', 'parcels to pack'),
    mails_bounced: (n: number) => counted(n, 'mail that did not arrive', 'mails that did not arrive'),
    disputes: (n: number) => counted(n, 'disputed payment', 'disputed payments'),
  },
  action: 'Open your desk',
  settings: 'How often this mail comes',
}
