import { writtenDay } from './written'

/** An order's own page: what happened, what is next, what can be done. */
export const orderWords = {
  title: (number: string, module: string) => `Order ${number}: ${module}`,
  from: (workshop: string) => `From ${workshop}`,
  states: {
    awaiting_deposit: 'waits for the deposit',
    waiting: 'on the waiting list',
    reserved: 'reserved',
    balance_due: 'balance due',
    paid: 'paid',
    packed: 'packed',
    posted: 'posted',
    cancelled: 'cancelled',
    expired: 'place released',
    lapsed: 'lapsed',
    withdrawn: 'withdrawn',
    returned: 'returned',
  } as Readonly<Record<string, string>>,
  next: 'What is next',
  nextFor: {
    hold: 'Your place is held, unpaid, until',
    holdThen: (deposit: string) =>
      `Pay the deposit of ${deposit} by then; otherwise the place is free again and nothing is charged.`,
    waiting: (position: number) =>
      `You are number ${position} on the waiting list. When a place is free you get a mail, and 48 hours to pay the deposit.`,
    reserved: (minimum: number, decideBy: string) =>
      `You have a place. The run goes ahead when ${minimum} units are under deposit; that is decided by ${writtenDay(decideBy)}. Until it is locked you can cancel and get everything back.`,
    locked: 'The run is locked: it is being built. You have a place.',
    balanceComing: (balance: string, card: string | null) =>
      card === null
        ? `The balance of ${balance} is due. No card is saved for it; please pay it here.`
        : `The balance of ${balance} is charged to your card ending ${card} on`,
    payBefore: 'You may pay it before, here.',
    balanceFailed: (balance: string, lapseOn: string) =>
      `The balance of ${balance} could not be charged. Please pay it by ${writtenDay(lapseOn)}; after that day the order lapses.`,
    bankAsks: 'Your bank wants you to confirm the payment.',
    paid: 'Everything is paid. Your parcel waits to be packed.',
    packed: 'Your parcel is packed and waits to be handed to the post.',
    posted: 'Your parcel is with the post.',
    cancelled: 'This order is cancelled. There is nothing more to do.',
    expired: 'The deposit was not paid in time, so the place is free again. Nothing was charged.',
    lapsed: 'The balance was not paid in time, so the order has lapsed.',
    withdrawn:
      'You have withdrawn from this order. Send the goods back within 14 days; what you paid goes back when they arrive.',
    returned: 'The goods are back with the workshop.',
    calledOff: 'The run was called off. Everything you paid goes back without your asking.',
    disputed:
      'Your bank is looking into a payment of this order. Until it has decided, nothing is packed, paid back or cancelled.',
  },
  reason: 'The workshop writes:',
  pay: {
    deposit: (sum: string) => `Pay the deposit of ${sum}`,
    balance: (sum: string) => `Pay the balance of ${sum}`,
    confirm: (sum: string) => `Confirm the payment of ${sum} with your bank`,
    change: (sum: string) => `Pay the difference of ${sum}`,
    otherCard: 'Pay with another card instead',
  },
  checking: {
    title: 'Waiting for the payment provider’s word',
    lead: 'You have paid; it takes a moment until we hear of it. This page goes on by itself.',
    button: 'Look again now',
    unknown: 'A payment was begun and nobody knows yet how it ended. Look again in a minute.',
  },
  cancel: 'Cancel this order',
  leave: 'Leave the waiting list',
  changeAddress: 'Change the address',
  withdraw: 'Withdraw from the contract here',
  withdrawTitle: (number: string) => `Withdraw from order ${number}`,
  withdrawLead: ({ hasRight, endsOn }: { hasRight: boolean; endsOn: string | null }) =>
    !hasRight
      ? 'The terms of this order let you withdraw until it is packed. Read it once more; the button withdraws for good.'
      : endsOn === null
        ? 'You may withdraw without giving a reason, until 14 days after the last piece has arrived. Read it once more; the button withdraws for good.'
        : `You may withdraw without giving a reason until ${writtenDay(endsOn)}. Read it once more; the button withdraws for good.`,
  withdrawOrder: 'The contract',
  withdrawName: 'Your name',
  withdrawMail: 'Your withdrawal is acknowledged, with day and time, to',
  withdrawBack: 'You get back',
  withdrawAfter: (sum: string) =>
    `${sum}, postage included, once the goods are back or you show that you sent them`,
  withdrawPosted:
    'You send the goods back within 14 days, at your own cost. The mail that acknowledges your withdrawal says where to.',
  withdrawButton: 'Confirm the withdrawal',
  cannotWithdraw:
    'You cannot withdraw from this order here where it stands now. Before the lock it is cancelled instead.',
  sendBack: 'Send the goods back to:',
  change: 'Change what you ordered',
  changeTitle: (number: string) => `Change order ${number}`,
  changeLead:
    'Until the run is locked. You see what it means once more before anything is changed. The address has a page of its own.',
  changeNext: 'Go on: see every sum',
  changeCheck: 'Check the change',
  changeCheckLead: 'Nothing is changed until you press the button at the foot.',
  changeBefore: 'Total before',
  changeAfter: 'Total after',
  changeDeposit: 'Deposit before and after',
  changeFromTo: (from: string, to: string) => `${from}, then ${to}`,
  changePay: (sum: string) =>
    `The deposit rises by ${sum}. The change holds as soon as that is paid, if the places are still free then; if not, it is paid back at once and the order stays as it is.`,
  changeBack: (sum: string) =>
    `The deposit falls by ${sum}. The change holds at once, and ${sum} goes back to the card you paid with.`,
  changeSame: 'The deposit stays as it is. The change holds at once.',
  changeButton: (sum: string | null) =>
    sum === null ? 'Change the order' : `Change the order with obligation to pay ${sum} now`,
  changeOpen: (sum: string) =>
    `You asked for a change of this order. It holds when its difference of ${sum} is paid; until then the order stays as it is.`,
  cannotChange: 'What is ordered can be changed only while the run takes deposits and yours has arrived.',
  story: 'What happened',
  events: {
    place: 'You placed the order; a place was held for you.',
    queue: 'You placed the order and joined the waiting list.',
    enter: 'The workshop entered the order.',
    place_offered: 'A place became free and was held for you.',
    leave: 'You left the waiting list.',
    deposit_captured: 'Your deposit arrived. You have a place in the run.',
    late_capture: 'Your deposit arrived late; your place was still free and is yours.',
    hold_ended: 'The time to pay ran out; the place was released.',
    cancel: 'You cancelled the order.',
    ask_balance: 'The run is far enough: the balance was announced.',
    nothing_due: 'Nothing was left to pay.',
    balance_captured: 'Your balance arrived. Everything is paid.',
    lapse: 'The balance was not paid in time; the order lapsed.',
    reinstate: 'The workshop took the order up again.',
    cancel_with_right: 'The order was cancelled.',
    run_called_off: 'The run was called off.',
    run_closed: 'The run closed before a place became free.',
    changed: 'What is ordered was changed.',
    address_changed: 'The address was changed.',
    pack: 'Your parcel was packed.',
    unpack: 'Your parcel was opened again.',
    parcel_handed_over: 'Your parcel was handed to the post.',
    hand_over: 'Everything is posted.',
    withdraw: 'You withdrew from the order.',
    return_received: 'The goods came back to the workshop.',
    refunded: 'Money went back to you.',
  } as Readonly<Record<string, string>>,
  what: 'What you ordered',
  promise: (day: string) => `posted by ${writtenDay(day)}`,
  money: 'What it costs',
  deposit: 'Deposit',
  balance: 'Balance',
  postage: 'Postage',
  goods: 'Modules',
  tax: 'Tax in it',
  total: 'Total',
  paid: 'Paid',
  paidBack: 'Paid back',
  card: 'Card for the balance',
  cardEnding: (brand: string, last4: string) => `${brand}, ending ${last4}`,
  address: 'It goes to',
  parcels: 'Parcels',
  parcelStates: {
    open: 'waits to be packed',
    packed: 'packed',
    handed_over: 'with the post',
    delivered: 'delivered',
    lost: 'lost',
    returned: 'came back',
  } as Readonly<Record<string, string>>,
  tracking: 'Tracking number',
  noTracking: 'This service has no tracking number.',
  refunds: 'What comes back',
  refundStates: {
    waiting: 'asked for; it goes out as soon as possible',
    on_its_way: 'on its way to your card',
    arrived: 'sent back to your card; banks take up to 10 days to show it',
    failed: 'did not go through; the workshop has been told',
  },
  invoices: 'Invoices',
  invoiceKinds: {
    prepayment: (number: number) => `Invoice ${number}, for a payment`,
    final: (number: number) => `Invoice ${number}, for the whole order`,
    credit_note: (number: number) => `Credit note ${number}`,
  },
  invoiceOf: (sum: string, day: string) => `${sum}, ${writtenDay(day)} (PDF)`,
  terms: (number: number) => `Terms of this order (version ${number})`,

  cancelTitle: (number: string) => `Cancel order ${number}`,
  cancelLead: 'Read it once more. The second click cancels the order for good.',
  cancelBack: (sum: string) => `${sum} goes back to the card you paid with.`,
  cancelNothing: 'Nothing was paid, so nothing comes back.',
  cancelPlace: 'Your place is offered to whoever waits next.',
  cancelButton: (number: string, sum: string | null) =>
    sum === null ? `Cancel order ${number}` : `Cancel order ${number} and get ${sum} back`,
  leaveButton: (number: string) => `Leave the waiting list with order ${number}`,
  keep: 'Keep the order',
  cannotCancel: 'This order cannot be cancelled here where it stands now.',

  addressTitle: (number: string) => `Address of order ${number}`,
  addressLead:
    'Until the order is packed. In another country postage and tax are worked out again; that changes the balance, never the deposit or the price.',
  addressSave: 'Save the address',
  cannotAddress: 'The order is packed or at its end, so its address can no longer be changed here.',
} as const
