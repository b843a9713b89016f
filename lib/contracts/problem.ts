/** RFC 9457 problem details as every error of the API answers them (`application/problem+json`). */
export type Problem = {
  /** 'about:blank', or a stable name of ours under /problems/. */
  type: string
  title: string
  status: number
  /** snake_case; finishes the sentence "refused because …". */
  reason?: string
  detail?: string
  /** Sentences at their fields: {'lines.0.quantity': 'Enter a whole number from 1 to 10.'}. */
  errors?: Record<string, string>
  /** Names one request in the log. */
  requestId?: string
}

/** A refusal that knows which fields it is about; the sentences stand at those fields. */
export type FieldRefusal = {
  readonly ok: false
  readonly reason: 'invalid'
  readonly errors: Record<string, string>
}

/**
 * Refuses with a sentence per field, named by its path in the body ('offers.0.depositMinor').
 * @example refuseFields({ slug: 'This address is taken.' }).reason  // → 'invalid'
 */
export function refuseFields(errors: Record<string, string>): FieldRefusal {
  return { ok: false, reason: 'invalid', errors }
}
