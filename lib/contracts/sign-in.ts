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

/** Six digits of an authenticator, or ten characters of a recovery code. */
export const SecondFactorInput = z.object({
  code: z
    .string({ error: 'Enter the code.' })
    .transform((typed) => typed.replaceAll(/[\s-]/g, ''))
    .pipe(
      z
        .string()
        .regex(/^(\d{6}|[0-9a-fA-F]{10})$/, 'Enter six digits, or a recovery code of ten characters.'),
    ),
  next: ownPath,
})
export type SecondFactorInput = z.infer<typeof SecondFactorInput>
