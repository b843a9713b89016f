import { writtenDay } from './written'

/** The owner's money: papers, tax, the books and how they compare with the payment provider's. */
export const moneyWords = {
  title: 'Money',
  pages: 'Pages about money',
  invoices: 'Invoices',
  invoicesLead: 'Every numbered paper, newest first. None is ever changed; a credit note takes one back.',
  invoicesCaption: 'Invoices and credit notes',
  noInvoices: 'There is none yet. The first comes with the first payment.',
  kinds: {
    prepayment: 'Invoice for a payment',
    final: 'Invoice',
    credit_note: 'Credit note',
  },
  paper: 'Paper',
  order: 'Order',
  issued: 'Issued on',
  sum: 'Sum, tax in',
  taxSum: 'Tax',
  tax: 'Tax report',
  taxLead: (isTaxed: boolean) =>
    isTaxed
      ? 'Tax counts in the month in which a payment arrives; credit notes take it off in the month they are issued.'
      : 'Tax counts in the month in which an order is posted; credit notes take it off in the month they are issued.',
  taxAdvice: 'The report adds up your papers. Check it against your local law, or ask your adviser.',
  taxCaption: (year: string) => `Tax of ${year}`,
  taxNone: 'Nothing fell due in this year.',
  month: 'Month',
  country: 'Country',
  rate: 'Rate',
  net: 'Without tax',
  gross: 'Tax in',
  year: 'Year',
  taxColumns: ['month', 'country', 'rate %', 'net', 'tax', 'gross', 'currency'],
  writtenMonth: (month: string) => writtenDay(`${month}-15`).replace(/^\S+ /, ''),
} as const
