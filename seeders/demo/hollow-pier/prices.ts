import type { Prices } from './shared'

const price = (priceMinor: number, depositMinor: number) => ({ priceMinor, depositMinor })

export const KEDGE_PRICES: Prices = {
  boards: price(3200, 800),
  kit: price(6900, 1900),
  built: price(12_500, 3000),
}
export const FAIRLEAD_PRICES: Prices = {
  boards: price(3900, 900),
  kit: price(8900, 2200),
  built: price(14_900, 3500),
}
export const ROWLOCK_PRICES: Prices = {
  boards: price(4500, 1000),
  kit: price(9500, 2500),
  built: price(16_500, 4000),
}
