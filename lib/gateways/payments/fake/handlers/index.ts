import 'server-only'
import type { HttpHandler } from 'msw'
import { ACCOUNTS } from '@/lib/gateways/payments/fake/handlers/accounts'
import { CHECKOUT } from '@/lib/gateways/payments/fake/handlers/checkout'
import { CUSTOMERS } from '@/lib/gateways/payments/fake/handlers/customers'
import { DISPUTES } from '@/lib/gateways/payments/fake/handlers/disputes'
import { LISTS } from '@/lib/gateways/payments/fake/handlers/lists'
import { PAYMENT_INTENTS } from '@/lib/gateways/payments/fake/handlers/payment-intents'
import { REFUNDS } from '@/lib/gateways/payments/fake/handlers/refunds'

/** Every route the fake answers; any other throws. */
export const HANDLERS: HttpHandler[] = [
  ...ACCOUNTS,
  ...CUSTOMERS,
  ...CHECKOUT,
  ...PAYMENT_INTENTS,
  ...REFUNDS,
  ...DISPUTES,
  ...LISTS,
]
