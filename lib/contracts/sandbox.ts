import { z } from 'zod'
import { email } from './fields'

export const SandboxSignIn = z.object({ email })

export const SandboxPay = z.object({
  payUrl: z.url('Give the link of the card page.').max(2000),
  card: z.string({ error: 'Give a test card number.' }).trim().min(1, 'Give a test card number.').max(40),
})

/** Hours, whole or part, forward only; ten years at most at once. */
export const SandboxClock = z.object({
  advanceHours: z.coerce
    .number({ error: 'Give the hours to pass.' })
    .positive('The clock only goes forward.')
    .max(87_600, 'Advance by at most ten years at once.'),
})
