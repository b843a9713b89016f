import { z } from 'zod'
import { countryCode, email, offerKind, slug, tick, token, wholeNumber } from './fields'

export const certainty = z.enum(['certain', 'likely', 'curious'], { error: 'Choose how sure you are.' })
export type Certainty = z.infer<typeof certainty>

/** What the interest form asks; no more personal data than an address to confirm by. */
export const SignUpInput = z.object({
  workshop: slug,
  module: slug,
  offer: offerKind,
  quantity: wholeNumber(1, 10),
  country: countryCode,
  certainty,
  topPriceMinor: z.preprocess(
    (typed) => (typed === '' ? undefined : typed),
    wholeNumber(0, 1_000_000_000).optional(),
  ),
  email,
  updates: tick,
})
export type SignUpInput = z.infer<typeof SignUpInput>

/** The same for every address, so that nobody learns who signed up. */
export type SignUpAnswer = { next: 'confirm' }

export const TokenInput = z.object({ token })
export type TokenInput = z.infer<typeof TokenInput>

/** 'confirmed' again for a link used twice; 'taken_back' after take-back. */
export type SignUpState = { state: 'confirmed' | 'taken_back' }

/** What the page of a mailed link shows before its button. */
export type LinkedSignUp = {
  state: 'unconfirmed' | 'confirmed' | 'superseded' | 'taken_back'
  /** Not confirmed in time. */
  isExpired: boolean
  workshop: { slug: string; name: string }
  module: { slug: string; name: string }
  offer: 'boards' | 'kit' | 'built'
  quantity: number
  country: string
  certainty: Certainty
}

export const UnsubscribeParams = z.object({ token: z.string().regex(/^[A-Za-z0-9_-]{16,100}$/) })
