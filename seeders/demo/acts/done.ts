import type { Result } from '@/lib/core/result'

type Refused = { readonly ok: false; readonly reason: string; readonly errors?: Record<string, string> }

/** What a deed gave back; a demo whose deeds are refused is wrong, and says where. */
export function done<T>(result: Result<T, string> | Refused, what: string): T {
  if (result.ok) return result.value
  const fields = 'errors' in result && result.errors ? ` ${JSON.stringify(result.errors)}` : ''
  throw new Error(`the demo: ${what} was refused because ${result.reason}${fields}`)
}
