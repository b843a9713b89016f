import { z } from 'zod'
import { email, token } from './fields'

/** A path of ours to go on at; anything else (another host, a protocol) is dropped rather than refused. */
export const ownPath = z.preprocess(
  (typed) =>
    typeof typed === 'string' && /^\/(?![/\\])[^\p{Cc}\\]{0,400}$/u.test(typed) ? typed : undefined,
  z.string().optional(),
)

export const SignInInput = z.object({ email, next: ownPath })
export type SignInInput = z.infer<typeof SignInInput>

export const SignInCodeInput = z.object({
  code: z
    .string({ error: 'Enter the six digits.' })
    .transform((typed) => typed.replaceAll(/[\s-]/g, ''))
    .pipe(z.string().regex(/^\d{6}$/, 'Enter the six digits.')),
})

export const SignInLinkInput = z.object({ token })
