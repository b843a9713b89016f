export const depositReceived = {
  subject: (number: string, module: string) => `Deposit received: order ${number}, ${module}`,
  lead: (deposit: string) =>
    `Your deposit of ${deposit} has arrived and you have a place in the run. This mail confirms our contract; please keep it.`,
  lineNote: (postedBy: string) => `Posted by ${postedBy}`,
  paidNow: 'Deposit, paid',
  paidLater: 'Balance, to pay later',
  condition: (minimum: number, decideBy: string) =>
    `The contract depends on the run: it goes ahead when ${minimum} units are under deposit, and we decide by ${decideBy}. Until the run is locked you can cancel on your order page and get everything back. If the run is called off you get everything back without asking.`,
  withdrawal: {
    by_law:
      'You may withdraw at any time until 14 days after the last piece has reached you and get everything back, deposit and standard postage included. Say so on your order page or by answering this mail.',
    by_terms: 'Once the run is locked, the terms below say until when you can cancel.',
  },
  action: 'Your order page',
  terms: (version: string) => `Terms of this order (${version})`,
}

export const placeReleased = {
  subject: (number: string, module: string) =>
    `The place held for you is free again: ${module}, order ${number}`,
  lead: 'The time to pay the deposit ran out, so the place held for you is free again. Nothing was charged.',
  again: 'While places are left you can order again.',
  action: 'Order again',
  over: 'This run takes no more orders.',
}

export const placeFree = {
  subject: (number: string, module: string) => `A place is free for you: ${module}, order ${number}`,
  lead: (until: string) => `You were next in line. A place in the run is held for you until ${until}.`,
  how: (deposit: string) =>
    `To take it, pay the deposit of ${deposit} by then. If you do not, the place goes to the next in line and nothing is charged.`,
  action: (deposit: string) => `Pay the deposit of ${deposit}`,
}
