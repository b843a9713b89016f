import type { Problem } from '@/lib/contracts/problem'
import { reasonWords } from '@/lib/messages/reasons'

/** The one map from a refusal to a status; a reason that is not here is a state that refuses (409). */
const STATUS: Record<string, number> = {
  unreadable: 400,
  not_signed_in: 401,
  wrong_origin: 403,
  not_found: 404,
  forbidden: 404,
  method_not_allowed: 405,
  too_large: 413,
  unsupported_type: 415,
  invalid: 422,
  other_body_for_key: 422,
  token_unknown: 404,
  unknown_link: 404,
  token_expired: 409,
  too_many: 429,
  busy: 503,
  bug: 500,
}

export const statusOf = (reason: string): number => STATUS[reason] ?? 409

/** A refusal as RFC 9457 problem details. */
export function problem(
  reason: string,
  more: { errors?: Record<string, string>; detail?: string; requestId?: string; headers?: HeadersInit } = {},
): Response {
  const status = statusOf(reason)
  const { headers, ...rest } = more
  const body: Problem = { type: 'about:blank', title: reasonWords(reason), status, reason, ...rest }
  const answer = new Response(JSON.stringify(body), { status, headers })
  answer.headers.set('content-type', 'application/problem+json')
  answer.headers.set('cache-control', 'no-store')
  return answer
}
