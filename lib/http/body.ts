import qs from 'node:querystring'
import { fieldsToBody } from '@/lib/contracts/form-fields'
import { ok, refuse, type Result } from '@/lib/core/result'

/** What a request carried, and how: as JSON, or as an HTML form's fields. */
export type ReadBody = {
  body: unknown
  /** The fields as typed, when it was a form; kept to show it again with its mistakes. */
  fields: Record<string, string> | null
  /** Amounts that could not be read, by field. */
  errors: Record<string, string>
  /** The bytes, for the hash of an idempotent request. */
  text: string
}

export const MAX_BODY_BYTES = 1_000_000

/** Reads a body of at most {@link MAX_BODY_BYTES}, counting while it streams. Refuses: too_large, unsupported_type, unreadable. */
export async function readBody(
  request: Request,
): Promise<Result<ReadBody, 'too_large' | 'unsupported_type' | 'unreadable'>> {
  const type = (request.headers.get('content-type') ?? '').split(';')[0]!.trim().toLowerCase()
  const text = await readText(request, MAX_BODY_BYTES)
  if (text === null) return refuse('too_large')
  if (type === 'application/json') {
    try {
      return ok({ body: JSON.parse(text) as unknown, fields: null, errors: {}, text })
    } catch {
      return refuse('unreadable')
    }
  }
  if (type === 'application/x-www-form-urlencoded') {
    const pairs = pairsOf(text)
    const { body, errors } = fieldsToBody(pairs)
    return ok({ body, fields: Object.fromEntries(pairs), errors, text })
  }
  if (text === '') return ok({ body: {}, fields: null, errors: {}, text })
  return refuse('unsupported_type')
}

function pairsOf(text: string): [string, string][] {
  const parsed = qs.parse(text, '&', '=', { maxKeys: 5000 })
  return Object.entries(parsed).flatMap(([name, value]) =>
    (Array.isArray(value) ? value : [value ?? '']).map((each): [string, string] => [name, each]),
  )
}

/** The body as text, or null once it is longer than allowed. */
export async function readText(request: Request, most: number): Promise<string | null> {
  if (Number(request.headers.get('content-length') ?? 0) > most) return null
  if (!request.body) return ''
  const reader = request.body.getReader()
  const pieces: Uint8Array[] = []
  let size = 0
  for (;;) {
    const { done, value } = await reader.read()
    if (done) return Buffer.concat(pieces).toString('utf8')
    size += value.byteLength
    if (size > most) {
      await reader.cancel()
      return null
    }
    pieces.push(value)
  }
}
