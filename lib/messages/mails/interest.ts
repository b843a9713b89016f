import { units } from '@/lib/messages/mails/words'

export const confirmSignup = {
  subject: (module: string) => `Please confirm your interest in ${module}`,
  lead: (what: string) =>
    `Someone, we hope you, told us they would like ${what}. It counts once you confirm it.`,
  action: 'Confirm my interest',
  after: (deleteOn: string) =>
    `This is not an order and costs nothing. If it was not you, do nothing: what is not confirmed is deleted on ${deleteOn}.`,
}

export const signupConfirmed = {
  subject: (module: string) => `Your interest in ${module} is confirmed`,
  lead: (what: string) => `Thank you. Your sign-up now counts: ${what}.`,
  next: 'When a run opens for deposits you are invited by mail, before everybody else. Until then nothing is due and nothing is promised.',
  withUpdates: 'You asked for news of this module. Every such mail carries a link that stops them.',
  withoutUpdates: 'You asked for no news, so the invitation is the next mail you get about it.',
  action: 'Change it or take it back',
}

export const depositsOpen = {
  subject: (module: string) => `${module}: deposits are open`,
  lead: (module: string, opensToAllAt: string) =>
    `You said you would like ${module}. The run is open, and those who signed up order first: everybody else can from ${opensToAllAt}.`,
  leadOpen: (module: string) => `You said you would like ${module}. The run is open, and you can order now.`,
  offerNote: (deposit: string, postedBy: string) =>
    `Deposit ${deposit} now, the rest when your modules are ready. Posted by ${postedBy}.`,
  withTax: 'Prices include tax. Postage to your country is shown before you order.',
  withoutTax: 'Tax, where it applies, and postage to your country are shown before you order.',
  condition: (minimum: number, maximum: number, decideBy: string) =>
    `The run goes ahead when ${units(minimum)} are under deposit; at most ${maximum} are built. We decide by ${decideBy}. If it does not go ahead, every deposit is paid back in full.`,
  action: 'See the run and order',
  takeBack: 'No longer interested: take my sign-up back',
}

export const runUpdate = {
  subject: (module: string, title: string) => `${module}: ${title}`,
  action: 'Read it on the page of the run',
}
