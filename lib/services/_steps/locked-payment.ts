import type { Order, PaymentAttempt, Run } from '@/models'

/** A payment whose run, order and attempt are locked, in this order. */
export type LockedPayment = { run: Run; order: Order; attempt: PaymentAttempt }
