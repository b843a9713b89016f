/**
 * Currencies that the payment provider takes without decimals, whatever ISO 4217 says (it says 2 for MGA).
 * Source: the provider's public API documentation, "Supported currencies", zero-decimal list. Changed only with it.
 */
export const PROVIDER_ZERO_DECIMAL: readonly string[] = [
  ...['BIF', 'CLP', 'DJF', 'GNF', 'JPY', 'KMF', 'KRW', 'MGA'],
  ...['PYG', 'RWF', 'VND', 'VUV', 'XAF', 'XOF', 'XPF'],
]

/**
 * Currencies without an ISO minor unit that the provider still takes with two decimals, which must be 00.
 * Source: the same page, special cases (ISK, UGX; from memory).
 */
export const PROVIDER_TWO_DECIMALS_OF_ZERO: readonly string[] = ['ISK', 'UGX']

/**
 * The smallest charge the provider takes, in its own units of the currency. Elsewhere any positive amount.
 * Source: the same page, minimum charge amounts (from memory; the account's settlement currency may raise them).
 */
export const PROVIDER_MINIMUM: Readonly<Record<string, number>> = {
  AED: 200,
  AUD: 50,
  BGN: 100,
  BRL: 50,
  CAD: 50,
  CHF: 50,
  CZK: 1500,
  DKK: 250,
  EUR: 50,
  GBP: 30,
  HKD: 400,
  HUF: 17500,
  INR: 50,
  JPY: 50,
  MXN: 1000,
  MYR: 200,
  NOK: 300,
  NZD: 50,
  PLN: 200,
  RON: 200,
  SEK: 300,
  SGD: 50,
  THB: 1000,
  USD: 50,
}

/**
 * The largest charge in the provider's own units: eight digits, more where the currency's units are small.
 * Source: the provider's public API documentation, amount of a payment (from memory).
 */
export const PROVIDER_MAXIMUM: Readonly<Record<string, number>> & { readonly others: number } = {
  IDR: 999_999_999_999,
  LBP: 999_999_999_999,
  others: 99_999_999,
}
