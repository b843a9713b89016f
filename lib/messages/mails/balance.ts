export const balanceComing = {
  subject: (amount: string, day: string) => `Balance of ${amount} due on ${day}`,
  charge: (amount: string, day: string, card: string) =>
    `On ${day} we charge the balance of ${amount} to the card ending in ${card}, as agreed when you paid the deposit.`,
  pay: (amount: string, day: string) => `The balance of ${amount} is due by ${day}. No card is saved for it.`,
  sooner: 'You can also pay now, or in another way, on the payment page.',
  action: (amount: string) => `Pay ${amount} now`,
  address: 'Please look at the address on your order page; you can change it until your order is packed.',
}

export const balancePaid = {
  subject: (number: string, module: string) => `Balance paid: order ${number}, ${module}`,
  lead: (amount: string) => `Your balance of ${amount} has arrived; your order is paid in full.`,
  leadCard: (amount: string, card: string) =>
    `Your balance of ${amount} was paid with the card ending in ${card}; your order is paid in full.`,
  paidTotal: 'Paid in all',
  next: 'Next we pack your order. You get a mail when the parcel is handed to the post.',
  invoice: 'Your invoice',
}

export const cardNeedsYou = {
  subject: (number: string) => `Your balance could not be charged: order ${number}`,
  why: {
    bank_asks: (amount: string) =>
      `Your bank wants your consent before it lets the balance of ${amount} through.`,
    declined: (amount: string) => `The balance of ${amount} was declined by your bank.`,
    expired: (amount: string) =>
      `The saved card has expired, so the balance of ${amount} could not be charged.`,
    no_card: (amount: string) => `No card is saved for the balance of ${amount}.`,
  },
  card: 'Card ending in',
  how: 'Please finish the payment on this page, with the same card or in another way:',
  action: (amount: string) => `Pay ${amount}`,
  lapse: (day: string) =>
    `If it is not paid by ${day}, the order lapses and the place goes to the next in line. We remind you before that.`,
}

export const balanceReminder = {
  subject: (nth: number, amount: string, number: string) =>
    nth === 3 ? `Last reminder: ${amount} for order ${number}` : `Reminder: ${amount} for order ${number}`,
  lead: (amount: string) => `The balance of ${amount} is still open.`,
  lapse: (day: string) =>
    `If it is not paid by ${day}, the order lapses and the place goes to the next in line.`,
  depositThen: {
    returned: (deposit: string) => `Your deposit of ${deposit} would then be paid back.`,
    kept: (deposit: string) =>
      `Your deposit of ${deposit} would then be kept, as the terms of your order say.`,
  },
  action: (amount: string) => `Pay ${amount}`,
  trouble: 'If something stands in the way, answer this mail and tell us.',
}

export const orderLapsed = {
  subject: (number: string, module: string) => `Order ${number} has lapsed: ${module}`,
  lead: 'The balance was not paid in time, so your order has lapsed and the place goes to the next in line.',
  depositThen: {
    returned: (deposit: string) =>
      `Your deposit of ${deposit} goes back the way it was paid; another mail follows when it is on its way.`,
    kept: (deposit: string) => `Your deposit of ${deposit} is kept, as the terms of your order say.`,
  },
  mistake: 'If this is a mistake, answer this mail: while a place is free, the order can be taken up again.',
}
