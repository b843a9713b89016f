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
  ordered: 'What was ordered',
  enteredBecause: 'Entered by hand',
  returnSummary: 'The goods are back',
  returnLead:
    'The buyer has withdrawn and sends the goods back. Price and standard postage go back when they are here, or when the buyer shows that they were sent.',
  returnButton: (sum: string) => `The goods are back: pay ${sum} back`,
  reinstateLead:
    'The order lapsed over its balance. If its deposit was kept and its place is free, it can be taken up again: the balance is announced anew.',
  reinstate: 'Take the order up again',
  cancelForBuyer: 'Cancel this order',
  cancelForBuyerButton: (sum: string) => `Cancel the order and pay ${sum} back`,
  cancelReason: 'Why',
  cancelReasonHint: 'The buyer reads it.',
  statement: 'What the books say',
  statementNone: 'Nothing is booked yet.',
  statementNote:
    'Plus is what comes in or is spent, minus what goes out or is owed. Every movement adds up to nothing; none is ever changed.',
  when: 'When',
  what: 'What',
  entries: 'Accounts',
  stands: 'What stands',
  ofOrder: (what: string, order: number) => `${what} (order ${order})`,
  enter: 'Enter an order',
  enterLead:
    'Paid elsewhere, or free: for a tester, a friend, a dealer. It takes places and is packed like any other, and never counts towards the minimum. Its money stays outside.',
  enterButton: 'Enter the order',
  enterPrice: (offer: string) => `Paid for each: ${offer}`,
  enterPriceHint: 'Tax in; 0 for a free one.',
  enterWho: 'For whom, and why',
  enterMail: 'E-mail address',
  enterReason: 'Why it is entered by hand',
  enterReasonHint: 'For your own books; the buyer does not read it.',
  books: 'Books',
  booksLead:
    'Your books are compared with the payment provider’s own lists every day: payments, money paid back, disputes, fees, payouts.',
  comparison: 'Compared with the payment provider',
  neverCompared: 'Nothing has been compared yet. It is done once a day, or now.',
  agree: 'No difference',
  agreeWords: (items: number) =>
    `${items} movements of the last 40 days agree to the smallest coin. Compared`,
  differ: (count: number) => (count === 1 ? 'One difference' : `${count} differences`),
  differWords: (items: number) => `Of ${items} movements of the last 40 days these do not agree. Compared`,
  differencesCaption: 'Differences',
  differences: {
    missing_here: 'The provider lists it; your books do not have it',
    missing_there: 'Your books have it; the provider does not list it',
    amount: 'The sums differ',
    currency: 'The currencies differ',
  },
  feeDiffers: (what: string) => `${what} (fees and what a dispute holds back)`,
  ours: 'Your books',
  theirs: 'The provider',
  nothing: 'nothing',
  compareNow: 'Compare now',
  stuck: 'What is stuck',
  nothingStuck: 'Nothing. Every payment, repayment and dispute has settled.',
  since: 'Since',
  stuckNote:
    'Each button asks the payment provider how things stand and writes that down, or sends what waits once more under its own mark. None can charge or pay back twice.',
  resolve: {
    attempt: 'Look it up',
    refund: 'Take it up again',
    dispute: 'Look it up',
    event: 'Apply it again',
  },
  export: 'A month of the books',
  monthHint: 'As YYYY-MM.',
  exportButton: 'Get the file (CSV)',
  ledgerColumns: ['at', 'transfer', 'movement', 'order', 'account', 'amount', 'currency'],
  writtenMonth: (month: string) => writtenDay(`${month}-15`).replace(/^\S+ /, ''),
} as const

/** What a movement of the books is called. */
export const movementNames: Readonly<Record<string, string>> = {
  deposit_paid: 'Deposit arrived',
  balance_paid: 'Balance arrived',
  change_paid: 'Difference of a change arrived',
  paid_outside: 'Paid outside',
  fee_charged: 'Fee of the payment provider',
  fee_lost: 'Fee that does not come back',
  refunded: 'Paid back',
  refund_failed: 'Paying back failed',
  tax_due: 'Tax fell due with a payment',
  tax_due_back: 'Tax taken back by a credit note',
  order_posted: 'Order posted: counted as sales',
  deposit_kept: 'Deposit kept',
  deposit_counted_again: 'Kept deposit counts for the order again',
  disputed: 'A bank disputes a payment',
  dispute_won: 'Dispute won',
  dispute_lost: 'Dispute lost',
  paid_out: 'Paid out to the bank',
  paid_in: 'Came back from the bank',
}

/** What an account is called. */
export const accountNames: Readonly<Record<string, string>> = {
  provider_balance: 'With the payment provider',
  bank: 'Bank',
  outside_receipts: 'Taken outside',
  disputed_funds: 'Held back by a dispute',
  tax_on_deposits: 'Tax on payments, until posting',
  customer_deposits: 'Owed to buyers',
  tax_payable: 'Tax owed',
  sales: 'Sales',
  kept_deposits: 'Deposits kept',
  sales_returned: 'Sales taken back',
  processing_fees: 'Fees of payments',
  fees_lost_on_refunds: 'Fees lost on what was paid back',
  dispute_fees: 'Fees of disputes',
  dispute_losses: 'Lost to disputes',
}

/** What is stuck, in words. */
export function stuckWords({
  kind,
  state,
  detail,
}: {
  kind: string
  state: string
  detail: string | null
}): string {
  if (kind === 'attempt') return 'A payment was begun; nobody knows yet how it ended.'
  if (kind === 'event') return 'Word from the payment provider has not been taken in yet.'
  if (kind === 'dispute') return 'A buyer’s bank disputes a payment. It decides; until then the order rests.'
  if (state === 'failed') return 'Paying back failed. Nothing has gone back.'
  if (detail === 'short') return 'Paying back waits: the balance with the payment provider is too small.'
  return state === 'pending'
    ? 'Money is on its way back and has not arrived for days.'
    : 'Paying back was asked for and has not gone out, or nobody knows whether it has.'
}
