import { MonthQuery, StuckInput, YearQuery } from '../money-desk'
import { CancelForBuyerInput, EnterOrderInput, OrderChangeInput } from '../orders'
import type { Operation } from './operation'

const desk = (operation: Omit<Operation, 'path'>, path: string): Operation => ({
  ...operation,
  path: `/api/admin/{workshop}${path}`,
})

/** Papers, changes, withdrawals and the books: what buyers and owners call about money. */
export const MONEY_OPERATIONS: readonly Operation[] = [
  {
    method: 'POST',
    path: '/api/orders/{order}/change/draft',
    summary: 'Price an order with other lines; nothing is changed yet',
    deed: 'self',
    body: OrderChangeInput,
    answer: 'ChangeQuoteView',
  },
  {
    method: 'POST',
    path: '/api/orders/{order}/change',
    summary:
      'Change what is ordered, before the lock: the difference is paid back at once, or waits to be paid',
    deed: 'self',
    body: OrderChangeInput,
    isIdempotent: true,
    answer: '{order, toPayMinor, refundMinor}',
  },
  {
    method: 'POST',
    path: '/api/orders/{order}/withdraw',
    summary: 'Withdraw from the contract, after the lock',
    deed: 'self',
    answer: '{state, refundMinor}',
  },
  {
    method: 'GET',
    path: '/api/invoices/{invoice}/paper.pdf',
    summary: 'A numbered paper, for its buyer and its workshop',
    deed: 'self',
    answer: 'a PDF file',
  },
  desk(
    {
      method: 'POST',
      summary: 'Enter an order paid elsewhere, or free',
      deed: 'order:enter',
      body: EnterOrderInput,
      isIdempotent: true,
      status: 201,
      answer: '{order, number}',
    },
    '/runs/{run}/orders',
  ),
  desk(
    {
      method: 'POST',
      summary: 'Cancel one order with a reason; everything is paid back',
      deed: 'order:cancel_for_buyer',
      body: CancelForBuyerInput,
      answer: '{state, refundMinor}',
    },
    '/orders/{order}/cancel',
  ),
  desk(
    {
      method: 'POST',
      summary: 'The goods of a withdrawal are back: price and standard postage go back',
      deed: 'order:receive_return',
      answer: '{state, refundMinor}',
    },
    '/orders/{order}/return',
  ),
  desk(
    {
      method: 'POST',
      summary: 'Take a lapsed order up again whose deposit was kept',
      deed: 'order:reinstate',
      answer: '{state}',
    },
    '/orders/{order}/reinstate',
  ),
  desk(
    {
      method: 'POST',
      summary: 'Compare the books with the payment provider’s lists now',
      deed: 'ledger:reconcile',
      answer: '{day, items, differences}',
    },
    '/money/compare',
  ),
  desk(
    {
      method: 'POST',
      summary: 'Take up something that is stuck, safely',
      deed: 'refund:retry',
      body: StuckInput,
      answer: '{state}',
    },
    '/money/resolve',
  ),
  desk(
    {
      method: 'GET',
      summary: 'A month of the books as CSV',
      deed: 'ledger:export',
      query: MonthQuery,
      answer: 'a CSV file',
    },
    '/ledger.csv',
  ),
  desk(
    {
      method: 'GET',
      summary: 'The tax of a year by month, country and rate as CSV',
      deed: 'tax:report',
      query: YearQuery,
      answer: 'a CSV file',
    },
    '/tax.csv',
  ),
]
