import 'server-only'
import { createHash } from 'node:crypto'
import type { Books } from '@/lib/gateways/payments/fake/books'
import { ProviderRefusal } from '@/lib/gateways/payments/fake/errors'

/** Keys may be forgotten after 24 h. Source: the provider's documentation of idempotent requests. */
const KEPT_SECONDS = 24 * 3600

/** What a request asks for; the same key with another fingerprint is an error. */
export function fingerprint(method: string, path: string, body: string): string {
  return createHash('sha256').update(`${method} ${path}\n${body}`).digest('hex')
}

/** The first answer under this key, errors included; null when the key is new or was forgotten. */
export async function remembered(books: Books, key: string, request: string) {
  if (key.length > 255) {
    const message = 'Idempotency keys may be at most 255 characters long.'
    throw new ProviderRefusal(400, { type: 'invalid_request_error', message }, 'nothing')
  }
  const { rows } = await books.sql.query(
    'select request, status, body, created from sandbox.keys where account = $1 and key = $2',
    [books.account, key],
  )
  if (rows.length === 0) return null
  if (Number(rows[0].created) + KEPT_SECONDS < books.now) {
    await books.sql.query('delete from sandbox.keys where account = $1 and key = $2', [books.account, key])
    return null
  }
  if (rows[0].request !== request) {
    const message =
      'Keys for idempotent requests can only be used with the same parameters they were first used with. ' +
      'Try using a key other than the one you meant to reuse.'
    throw new ProviderRefusal(400, { type: 'idempotency_error', message }, 'nothing')
  }
  return { status: Number(rows[0].status), body: String(rows[0].body) }
}

/** Keeps the first answer under a key. */
export async function remember(
  books: Books,
  key: string,
  request: string,
  answer: { status: number; body: string },
): Promise<void> {
  await books.sql.query(
    'insert into sandbox.keys (account, key, request, status, body, created) values ($1, $2, $3, $4, $5, $6)',
    [books.account, key, request, answer.status, answer.body, books.now],
  )
}
