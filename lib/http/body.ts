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
  /** Files that came along, by field; those nobody chose are left out. */
  files: Record<string, SentFile>
}

/** A file as a browser sent it; name and type are its word only. */
export type SentFile = { name: string; type: string; content: Buffer }

export const MAX_BODY_BYTES = 1_000_000

/**
 * Reads a body of at most {@link MAX_BODY_BYTES}, or `upload` bytes where files are taken, counting while it streams.
 * Refuses: too_large, unsupported_type, unreadable.
 */
export async function readBody(
  request: Request,
  upload?: number,
): Promise<Result<ReadBody, 'too_large' | 'unsupported_type' | 'unreadable'>> {
  const type = (request.headers.get('content-type') ?? '').split(';')[0]!.trim().toLowerCase()
  if (type === 'multipart/form-data' && upload !== undefined) return readUpload(request, upload)
  const text = await readText(request, MAX_BODY_BYTES)
  if (text === null) return refuse('too_large')
  if (type === 'application/json') {
    try {
      return ok({ body: JSON.parse(text) as unknown, fields: null, errors: {}, text, files: {} })
    } catch {
      return refuse('unreadable')
    }
  }
  if (type === 'application/x-www-form-urlencoded') {
    const pairs = pairsOf(text)
    const { body, errors } = fieldsToBody(pairs)
    return ok({ body, fields: Object.fromEntries(pairs), errors, text, files: {} })
  }
  if (text === '') return ok({ body: {}, fields: null, errors: {}, text, files: {} })
  return refuse('unsupported_type')
}

async function readUpload(
  request: Request,
  most: number,
): Promise<Result<ReadBody, 'too_large' | 'unreadable'>> {
  const bytes = await readBytes(request, most)
  if (bytes === null) return refuse('too_large')
  const headers = { 'content-type': request.headers.get('content-type') ?? '' }
  const form = await new Response(new Uint8Array(bytes), { headers }).formData().catch(() => null)
  if (!form) return refuse('unreadable')
  const pairs: [string, string][] = []
  const files: Record<string, SentFile> = {}
  for (const [name, value] of form) {
    if (typeof value === 'string') pairs.push([name, value])
    else if (value.name !== '' || value.size > 0)
      files[name] = { name: value.name, type: value.type, content: Buffer.from(await value.arrayBuffer()) }
  }
  const { body, errors } = fieldsToBody(pairs)
  return ok({ body, fields: Object.fromEntries(pairs), errors, text: '', files })
}

function pairsOf(text: string): [string, string][] {
  const parsed = qs.parse(text, '&', '=', { maxKeys: 5000 })
  return Object.entries(parsed).flatMap(([name, value]) =>
    (Array.isArray(value) ? value : [value ?? '']).map((each): [string, string] => [name, each]),
  )
}

/** The body as text, or null once it is longer than allowed. */
export async function readText(request: Request, most: number): Promise<string | null> {
  return (await readBytes(request, most))?.toString('utf8') ?? null
}

async function readBytes(request: Request, most: number): Promise<Buffer | null> {
  if (Number(request.headers.get('content-length') ?? 0) > most) return null
  if (!request.body) return Buffer.alloc(0)
  const reader = request.body.getReader()
  const pieces: Uint8Array[] = []
  let size = 0
  for (;;) {
    const { done, value } = await reader.read()
    if (done) return Buffer.concat(pieces)
    size += value.byteLength
    if (size > most) {
      await reader.cancel()
      return null
    }
    pieces.push(value)
  }
}
