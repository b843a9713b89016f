export const parcelHandedOver = {
  subject: (number: string) => `Your parcel is on its way: order ${number}`,
  subjectReplacement: (number: string) => `Your replacement is on its way: order ${number}`,
  lead: (day: string) => `We handed this parcel to the post on ${day}:`,
  service: 'Sent as',
  tracking: 'Tracking number',
  noTracking: 'none with this service',
  follow: 'Follow the parcel',
  more: 'The rest of your order comes in another parcel; you get a mail for it too.',
  customs:
    'The parcel crosses a customs border. The post may ask you for import tax or duty before it delivers.',
  problem: 'If anything is missing, damaged or faulty, or it does not arrive, tell us here:',
  report: 'Report a problem',
}

const problems = {
  missing_part: 'a part is missing',
  fault: 'a fault',
  wrong: 'something wrong was sent',
  damaged: 'it arrived damaged',
  lost: 'the parcel has not arrived',
  other: 'something else',
} as const

export const problemOpened = {
  subject: (number: string) => `We have your report: order ${number}`,
  lead: (what: keyof typeof problems) => `You told us: ${problems[what]}. We are looking at it.`,
  answerBy: (day: string) => `You hear from us by ${day}.`,
  lost: 'You need not wait for the post to finish looking for the parcel; that is our concern.',
  add: 'You can add pictures or words on the page of your report.',
  action: 'Your report',
}

export const problemAnswered = {
  subject: (number: string) => `An answer to your report: order ${number}`,
  lead: {
    part: 'We send you the part.',
    replacement: 'We send you a replacement.',
    repair: 'We repair it; what to do is written below.',
    part_refund: 'We pay a part of the price back.',
    full_refund: 'We pay the whole price back.',
    message: 'We have written to you about it:',
  },
  refund: 'You get back',
  action: 'Answer or see your report',
}

export const withdrawalAcknowledged = {
  subject: (number: string) => `Your withdrawal has arrived: order ${number}`,
  lead: (number: string, at: string) => `We received your withdrawal from order ${number} on ${at}.`,
  refund: (amount: string, day: string) => `We pay ${amount} back, the way it was paid, by ${day}.`,
  sendBack: 'Please send the goods back to:',
  sendBackBy: (day: string) =>
    `Please post them by ${day}. We may wait with the money until they, or proof that you posted them, have reached us.`,
  nothingPosted: 'Nothing has been posted yet, so there is nothing to send back.',
}

export const refundSent = {
  subject: (amount: string, number: string) => `${amount} is on its way back: order ${number}`,
  cause: {
    cancelled: 'Your order was cancelled.',
    withdrawn: 'You withdrew from the order.',
    run_called_off: 'The run was called off.',
    late_capture: 'Your payment came when there was no place for it any more.',
    surplus: 'More had been paid than was due.',
    order_change: 'Your order was changed.',
    lapsed: 'The order lapsed.',
    problem: 'It settles the problem you reported.',
    notice: 'You chose to cancel after our notice.',
    postage: 'The postage turned out lower.',
    price_fell: 'The price is lower now, and that holds for your order too.',
    owner: 'It belongs to your order.',
  },
  lead: (amount: string) => `We have sent ${amount} back, the way it was paid.`,
  toCard: (amount: string, card: string) => `We have sent ${amount} back to the card ending in ${card}.`,
  wait: 'Banks usually show it within 5 to 10 days.',
}

export const orderCancelled = {
  subject: (number: string, module: string) => `Order ${number} is cancelled: ${module}`,
  cause: {
    customer: 'You cancelled your order.',
    owner: 'We had to cancel your order.',
    notice: 'You chose to cancel after our notice.',
    silence: 'Your order is cancelled, because our notice about the new date was not answered.',
    broken_promise: 'You cancelled your order after the promised date had passed.',
    run_closed: 'The run is closed and no place came free for you.',
    left_queue: 'You left the waiting list.',
  },
  reason: 'The reason:',
  refund: (amount: string) =>
    `You get ${amount} back, the way it was paid; another mail follows when it is on its way.`,
  nothingPaid: 'Nothing had been paid, so nothing is due on either side.',
}
