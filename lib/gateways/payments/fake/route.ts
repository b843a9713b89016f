import 'server-only'
import { http, HttpResponse, type HttpHandler } from 'msw'
import { env } from '@/lib/config/env'
import { nextBreak } from '@/lib/gateways/payments/fake/break-calls'
import { type Books, nextNumber, withBooks } from '@/lib/gateways/payments/fake/books'
import { isFault } from '@/lib/gateways/payments/fake/chance'
import { type ErrorBody, invalid, ProviderRefusal } from '@/lib/gateways/payments/fake/errors'
import { expand } from '@/lib/gateways/payments/fake/expand'
import { fingerprint, remember, remembered } from '@/lib/gateways/payments/fake/idempotency'
import { Params } from '@/lib/gateways/payments/fake/params'

/** One request, its parameters read and its books open. */
export type Call = {
  readonly books: Books
  readonly params: Params
  /** The id in the path; '' where there is none. */
  readonly id: string
  /** A second id in the path. */
  readonly childId: string
  readonly path: string
}

/** What goes back, as text. */
export type Answer = { status: number; body: string; isReplay?: boolean }

type Options = {
  /** Parameters the fake models; any other is a bug of the fake or of ours. */
  known: readonly string[]
  /** Whether the call may end in a 500 after it was carried out (only where a look-up can end the doubt). */
  mayBreak?: boolean
}

const BROKEN: ErrorBody = { type: 'api_error', message: 'An unknown error occurred' }
const TOO_MANY: ErrorBody = { type: 'rate_limit_error', code: 'rate_limit', message: 'Too many requests' }
const textOf = (error: ErrorBody): string => JSON.stringify({ error })

/** Runs the work inside a savepoint, so that a refusal leaves behind only what it says. */
async function carryOut(call: Call, work: (call: Call) => Promise<object>): Promise<Answer> {
  const { sql } = call.books
  const { outbox } = call.books
  await sql.query('savepoint before_call')
  try {
    const answer = await expand(call.books, await work(call), call.params.list('expand'))
    return { status: 200, body: JSON.stringify(answer) }
  } catch (error) {
    if (!(error instanceof ProviderRefusal) || error.keeps === 'nothing') throw error
    if (error.keeps === 'answer') {
      await sql.query('rollback to savepoint before_call')
      outbox.length = 0
    }
    return { status: error.status, body: textOf(error.body) }
  }
}

async function answerCall(
  call: Call,
  key: string | null,
  request: string,
  breakShare: number,
  work: (call: Call) => Promise<object>,
) {
  if (call.books.account !== '') await requireAccount(call.books)
  const before = key === null ? null : await remembered(call.books, key, request)
  if (before !== null) return { ...before, isReplay: true }
  const done = await carryOut(call, work)
  const isBroken = breakShare === 1 || isFault('broken', await nextNumber(call.books), breakShare)
  const answer = isBroken ? { status: 500, body: textOf(BROKEN) } : done
  if (key !== null) await remember(call.books, key, request, answer)
  return answer
}

async function requireAccount({ sql, account }: Books): Promise<void> {
  const { rowCount } = await sql.query("select 1 from sandbox.objects where id = $1 and kind = 'account'", [
    account,
  ])
  if (rowCount === 1) return
  const message = `The provided key does not have access to account '${account}' (or that account does not exist).`
  throw new ProviderRefusal(
    403,
    { type: 'invalid_request_error', code: 'account_invalid', message },
    'nothing',
  )
}

function toResponse({ status, body, isReplay }: Answer) {
  const headers: Record<string, string> = {
    'content-type': 'application/json',
    'request-id': `req_${Date.now()}`,
  }
  if (isReplay) headers['idempotent-replayed'] = 'true'
  // The provider says so itself: a repeat with the key would only be told the same.
  if (status >= 500) headers['stripe-should-retry'] = 'false'
  return new HttpResponse(body, { status, headers })
}

/** Every n-th connection breaks before or after the call, under faults. */
async function breaks(label: string): Promise<boolean> {
  if (env().SANDBOX_FAULTS !== 'all') return false
  return isFault(label, await withBooks('', nextNumber), 0.03)
}

/** One route of the provider's API, typed by what the SDK expects back. */
export function route<T extends object>(
  method: 'get' | 'post',
  path: string,
  { known, mayBreak = false }: Options,
  work: (call: Call) => Promise<T>,
): HttpHandler {
  return http[method](`*${path}`, async ({ request, params }) => {
    const url = new URL(request.url)
    const text = method === 'post' ? await request.text() : url.search.slice(1)
    if (!request.headers.get('authorization')?.startsWith('Bearer sk_test_')) {
      return toResponse({
        status: 401,
        body: textOf({ type: 'invalid_request_error', message: 'Invalid API Key provided' }),
      })
    }
    const planned = nextBreak(method, url.pathname)
    if (planned === 'before' || (await breaks('request_lost'))) return HttpResponse.error()
    if (planned === 'error_429') return toResponse({ status: 429, body: textOf(TOO_MANY) })
    const query = new Params(text)
    query.onlyKnown([...known, 'expand.*'])
    const account = request.headers.get('stripe-account') ?? ''
    const key = method === 'post' ? request.headers.get('idempotency-key') : null
    const breakShare = planned === 'error_500' ? 1 : mayBreak ? 0.06 : 0
    const answer = await withBooks(account, (books) => {
      const call = {
        books,
        params: query,
        id: String(params['id'] ?? ''),
        childId: String(params['child'] ?? ''),
        path: url.pathname,
      }
      return answerCall(call, key, fingerprint(method, url.pathname, text), breakShare, work)
    }).catch((error: unknown) => {
      if (error instanceof ProviderRefusal) return { status: error.status, body: textOf(error.body) }
      throw error
    })
    const isLost = planned === 'after' || (method === 'post' && (await breaks('answer_lost')))
    if (isLost) return HttpResponse.error()
    return toResponse(answer)
  })
}

/** The route's own id must not be empty. */
export function requireId(call: Call): string {
  if (call.id === '') throw invalid('Missing id')
  return call.id
}
