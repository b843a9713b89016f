import { offerNames } from '@/lib/messages/mails/words'
import { plural } from '@/lib/messages/plural'

const orders = (count: number) => plural(count, { one: '# order', other: '# orders' })
const units = (count: number) => plural(count, { one: '# unit', other: '# units' })

/** Every word on the printed papers. */
export const papers = {
  offers: offerNames,
  sheet: (n: number, of: number) => `${n} of ${of}`,
  block: { what: 'What', workshop: 'Workshop', by: 'Made by', on: 'Made on', sheet: 'Sheet' },
  unprintable:
    'Some letters could not be printed as written: accents are left off, or a ? stands for the letter. The screen shows them.',
  list: {
    name: 'Fulfilment list',
    summary: (orderCount: number, unitCount: number) =>
      `${orders(orderCount)}, ${units(unitCount)}, oldest promise first. Orders of the same contents stand together.`,
    pick: 'To take from the shelf, place by place',
    place: (place: string) => `[${place}]`,
    continued: (contents: string) => `${contents} (continued)`,
    same: (count: number) => `The same in ${orders(count)}`,
    nothing: 'Nothing waits to be packed.',
    note: 'Mind:',
  },
  invoice: {
    names: { prepayment: 'Invoice for a payment on account', final: 'Invoice', credit_note: 'Credit note' },
    number: (number: number) => `Number ${number}`,
    order: (number: number) => `Order ${number}`,
    issued: (day: string) => `Issued on ${day}`,
    corrects: (number: number, day: string) => `For invoice ${number} of ${day}`,
    seller: 'From',
    buyer: 'To',
    taxNumber: (text: string) => `Tax number ${text}`,
    vatNumber: (text: string) => `VAT number ${text}`,
    erased: 'The address has been deleted at the buyer’s wish.',
    columns: { quantity: 'Quantity', what: 'What', unit: 'Each', tax: 'Tax rate', sum: 'Sum, tax in' },
    net: (rate: string) => `Without tax, at ${rate}`,
    tax: (rate: string) => `Tax of ${rate}`,
    total: 'Total',
    charged: 'Left to pay with this invoice',
    back: 'Paid back in total',
    taxedLater: 'The tax falls due when the goods are posted; the final invoice names it.',
    noReverseCharge: 'VAT numbers are printed as given. Tax is not shifted to the buyer.',
  },
}
