import { offerNames } from '@/lib/messages/mails/words'

/** Words of the lines of invoices and credit notes; kept with the paper, so that it never changes. */
export const invoiceText = {
  prepayment: (purpose: string, order: number) =>
    purpose === 'deposit'
      ? `Deposit for order ${order}`
      : purpose === 'balance'
        ? `Balance of order ${order}`
        : purpose === 'outside'
          ? `Paid outside for order ${order}`
          : purpose === 'again'
            ? `Paid for order ${order}, at the rate of its new country`
            : `Paid for a change of order ${order}`,
  goods: (module: string, offer: keyof typeof offerNames, choices: readonly string[]) =>
    [`${module}, ${offerNames[offer]}`, ...choices].join('; '),
  postage: 'Postage',
  reduced: 'Reduction: paid back before posting',
  setOff: (number: number, day: string) => `Less invoice ${number} of ${day}`,
  credit: (number: number) => `Paid back of invoice ${number}`,
  reissued: 'Taken back: the order goes to another country and is invoiced anew',
  kept: 'Taken back: the order lapsed, and the deposit is kept as agreed',
} as const
