/** An account of a workshop's books. */
export type Account = keyof typeof ACCOUNTS

/** What an account is: what we have, what we owe, what came in, what it cost. */
export type AccountKind = 'asset' | 'liability' | 'income' | 'expense'

/**
 * The accounts of every workshop. Debits (+) raise assets and expenses, credits (−) raise liabilities and income.
 * Source: own chart, kept to what a run of modules needs; its names are printed in the month's export.
 */
export const ACCOUNTS = {
  /** Money lying with the payment provider, available or on its way there. */
  provider_balance: 'asset',
  /** Money paid out to the workshop's bank. */
  bank: 'asset',
  /** Money taken outside the provider for an order entered by hand. */
  outside_receipts: 'asset',
  /** Money the provider holds back while a buyer's bank disputes it. */
  disputed_funds: 'asset',
  /** Tax that fell due on deposits before the order's revenue is counted. */
  tax_on_deposits: 'asset',
  /** What buyers have paid for orders not yet posted: owed as goods, or as money if the run is called off. */
  customer_deposits: 'liability',
  /** Tax owed to a state. */
  tax_payable: 'liability',
  /** Orders posted, without tax. */
  sales: 'income',
  /** Deposits kept when an order lapsed, where terms and law allow it. */
  kept_deposits: 'income',
  /** Paid back after posting, without tax; lowers sales. */
  sales_returned: 'expense',
  /** The provider's fees for charges that stood. */
  processing_fees: 'expense',
  /** The provider's fees for charges that were paid back and whose fee did not come back. */
  fees_lost_on_refunds: 'expense',
  /** The provider's fees for disputes. */
  dispute_fees: 'expense',
  /** Posted orders whose money a dispute took away. */
  dispute_losses: 'expense',
} as const satisfies Record<string, AccountKind>

/**
 * Whether an account is what we have, what we owe, what came in or what it cost.
 * @example kindOfAccount('customer_deposits')  // → 'liability'
 */
export function kindOfAccount(account: Account): AccountKind {
  return ACCOUNTS[account]
}
