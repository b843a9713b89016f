import 'server-only'
import type Stripe from 'stripe'
import { accountCalls } from '@/lib/gateways/payments/accounts'
import { bookCalls } from '@/lib/gateways/payments/books'
import { chargeCalls } from '@/lib/gateways/payments/charges'
import { checkoutCalls } from '@/lib/gateways/payments/checkout'
import { disputeCalls } from '@/lib/gateways/payments/disputes'
import { lookUpCalls } from '@/lib/gateways/payments/look-ups'
import { refundCalls } from '@/lib/gateways/payments/refunds'
import type { Payments } from '@/lib/gateways/payments/types'
import { verifyWebhook } from '@/lib/gateways/payments/webhook'

/** The gateway over the SDK; real provider and fake differ only in what the SDK talks to. */
export function paymentsOver(stripe: Stripe, { isFake }: { isFake: boolean }): Payments {
  return {
    isFake,
    ...accountCalls(stripe),
    ...checkoutCalls(stripe),
    ...chargeCalls(stripe),
    ...refundCalls(stripe),
    ...lookUpCalls(stripe),
    ...bookCalls(stripe),
    ...disputeCalls(stripe),
    verifyWebhook,
  }
}
