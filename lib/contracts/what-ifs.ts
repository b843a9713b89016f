import { z } from 'zod'
import { line, minorAmount, offerKind, uuid, wholeNumber, type OfferKind } from './fields'
import { currencyCode, percent } from './plan-fields'
import { blank } from './rows'

/** Prices a supplier's goods go up or down by, in whole per cent. */
const change = z
  .string()
  .trim()
  .regex(/^[+-]?\d{1,3}$/, 'Enter whole per cent, such as 10 or -5.')
  .transform(Number)
  .refine((points) => points >= -90 && points <= 300, 'Enter a change from -90 to 300 per cent.')

/** A named what-if of a run's plan; what is left empty stays as planned. */
export const WhatIfInput = z
  .object({
    currency: currencyCode,
    name: line(80, 'Name it.'),
    prices: z
      .array(z.object({ offer: offerKind, priceMinor: blank(minorAmount()) }))
      .max(3)
      .default([]),
    units: blank(wholeNumber(1, 10_000)),
    yieldPercent: blank(percent()),
    supplier: blank(line(120)),
    supplierDoes: blank(z.enum(['left_out', 'prices'], { error: 'Choose one of the two.' })),
    supplierPercent: blank(change),
  })
  .superRefine(({ prices, yieldPercent, supplier, supplierDoes, supplierPercent }, check) => {
    const at = (path: (string | number)[], message: string) =>
      check.addIssue({ code: 'custom', path, message })
    prices.forEach(({ priceMinor }, i) => {
      if (priceMinor === 0) at(['prices', i, 'priceMinor'], 'Enter a price above zero.')
    })
    if (yieldPercent === 0) at(['yieldPercent'], 'Enter a yield above 0 %.')
    if (supplier !== undefined && supplierDoes === undefined)
      at(['supplierDoes'], 'Say what is different about this supplier.')
    if (supplier === undefined && (supplierDoes !== undefined || supplierPercent !== undefined))
      at(['supplier'], 'Choose the supplier.')
    if (supplierDoes === 'prices' && supplierPercent === undefined)
      at(['supplierPercent'], 'Enter by how much the prices change.')
  })
export type WhatIfInput = z.infer<typeof WhatIfInput>
export const WhatIfRemoval = z.object({ plan: uuid })

/** A run as planned beside its what-ifs; the first is the plan itself. */
export type WhatIfFigures = {
  /** null for the run's own plan. */
  id: string | null
  name: string
  units: number
  prices: { offer: OfferKind; priceMinor: number }[]
  yieldBasisPoints: number
  breakEven: number | null
  profit: number
  costPerUnit: number
  profitPerUnit: number
  starts: number
  cashLow: number
  expectedProfit: number
  chanceOfLoss: number
  unpriced: number
}

export type WhatIfDesk = {
  run: { id: string; number: number; currency: string; maximum: number }
  module: { slug: string; name: string }
  locale: string
  offers: { offer: OfferKind; priceMinor: number }[]
  suppliers: string[]
  /** Empty without a plan that knows every offer of the run. */
  plans: WhatIfFigures[]
  canAdd: boolean
}
