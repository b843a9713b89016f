import { units } from '@/lib/messages/mails/words'

export const runLocked = {
  subject: (module: string) => `${module}: the run goes ahead`,
  lead: (deposited: number, minimum: number) =>
    `${units(deposited)} under deposit, with a minimum of ${minimum}: the run is locked and will be built.`,
  below: (deposited: number, minimum: number) =>
    `${units(deposited)} under deposit, with a minimum of ${minimum}. We go ahead all the same, and this is why:`,
  next: 'You do not need to do anything now. We write when there is news, and before anything is charged.',
}

export const runCalledOff = {
  subject: (module: string) => `${module}: the run is called off`,
  owner: 'We have called the run off; it will not be built.',
  clock: 'Nobody decided about the run in time, so it called itself off. It will not be built.',
  reason: 'The reason:',
  refund: (amount: string) =>
    `You get ${amount} back, the way it was paid. You need not do anything; another mail follows when it is on its way.`,
  nothingPaid: 'You had paid nothing, so nothing is due on either side.',
}

export const runChanged = {
  minimumSubject: (module: string) => `${module}: the minimum is lowered`,
  decideBySubject: (module: string) => `${module}: the decision comes later`,
  minimum: (from: number, to: number, deposited: number) =>
    `The run can now go with ${units(to)} under deposit instead of ${from}; ${deposited} are there already.`,
  decideBy: (from: string, to: string) =>
    `We decide about the run by ${to} instead of ${from}. This day moves only once.`,
  callsItselfOff: (day: string) =>
    `If nobody has decided by ${day}, the run calls itself off and everyone is paid back.`,
  cancelFreely:
    'You need not do anything. Until the run is locked you can cancel on your order page and get everything back.',
  waiting: 'You still wait for a place and have paid nothing. You can leave the list on your order page.',
}

export const changeNotice = {
  subject: (module: string) => `${module}: something has changed, please read`,
  lead: {
    revision: 'The modules of your order will be built on a mended revision:',
    part: 'A part of the modules you ordered is replaced:',
    decide_by: 'The day by which we decide about the run has moved:',
    minimum: 'The minimum of the run has been lowered:',
    other: 'Something we had stated about the run has changed:',
  },
  choice: (refund: string) =>
    `If you agree you need not do anything. If you do not, you can cancel free of charge and get ${refund} back.`,
  answerBy: (day: string) => `Please choose by ${day}.`,
  action: 'Read it and choose',
}

export const delayNotice = {
  subject: {
    delay: (module: string) => `${module}: later than promised, please choose`,
    broken_promise: (module: string) => `${module}: the promised date has passed`,
  },
  lead: {
    delay: (number: string) => `We cannot post your order ${number} by the day we promised.`,
    broken_promise: (number: string) =>
      `Your order ${number} should have been posted by now, and we did not tell you in time. We are sorry.`,
  },
  promised: (promisedBy: string) => `Promised by ${promisedBy}`,
  now: (revisedBy: string) => `now by ${revisedBy}`,
  noDate: 'no new date yet',
  reason: 'The reason:',
  choices: (refund: string) => `You have two choices, both free: wait, or cancel and get ${refund} back.`,
  action: 'Choose: wait or cancel',
  silence: {
    wait: 'If you do not answer, you keep your place. You can still cancel later.',
    waitUntil: (answerBy: string) =>
      `If you do not answer by ${answerBy}, we take it that you wait. You can still cancel later.`,
    cancel: 'If you do not answer, the order is cancelled and everything is paid back.',
    cancelOn: (answerBy: string) =>
      `If you do not answer by ${answerBy}, the order is cancelled and everything is paid back.`,
  },
  refundBy: (day: string) => `Should it be cancelled, the money is sent back by ${day}.`,
}
