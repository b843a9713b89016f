import 'server-only'
import { createHash } from 'node:crypto'
import { z } from 'zod'
import type { Purpose } from '@/lib/gateways/payments/types'

const shared = {
  account: z.string(),
  customer: z.string(),
  orderId: z.uuid(),
  attemptId: z.uuid(),
  purpose: z.custom<Purpose>((text) => /^(deposit|balance|change-[1-9][0-9]*)$/.test(String(text))),
  amount: z.int().positive(),
  currency: z.string(),
  description: z.string(),
}

/** What a call for money is made with, as it is stored: ids, sums and addresses of ours; a repeat sends the very same. */
export const CheckoutParams = z.strictObject({
  ...shared,
  saveCard: z.boolean(),
  successUrl: z.string(),
  cancelUrl: z.string(),
  expiresAt: z.iso.datetime(),
})
export type CheckoutParams = z.infer<typeof CheckoutParams>

export const SavedCardParams = z.strictObject({ ...shared, method: z.string() })
export type SavedCardParams = z.infer<typeof SavedCardParams>

/** SHA-256 of the parameters, hex, whatever the order of their names. */
export function hashOfParams(params: CheckoutParams | SavedCardParams): string {
  const sorted = Object.entries(params).sort(([a], [b]) => (a < b ? -1 : 1))
  return createHash('sha256').update(JSON.stringify(sorted)).digest('hex')
}
