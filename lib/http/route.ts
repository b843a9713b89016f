import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { actorOf } from '@/lib/auth/actor'
import { log } from '@/lib/config/log'
import type { FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import type { Deed } from '@/lib/core/policy/deeds'
import { needsSecondFactor, secondFactorFresh } from '@/lib/core/policy/second-factor'
import type { Result } from '@/lib/core/result'
import { clock } from '@/lib/gateways/clock'
import { paths } from '@/lib/paths'
import { Workshop } from '@/models'
import { readBody, type ReadBody, type SentFile } from './body'
import { problem } from './errors'
import { keepDraft } from './form-draft'
import { isOwnOrigin } from './origin'
import { waitFor, type LimitName } from './rate-limit'
import { settleRequestKey, takeRequestKey } from './request-key'

export type RouteContext<P, Q, B> = {
  actor: Actor
  params: P
  query: Q
  body: B
  /** The fields as typed, when a form was sent. */
  fields: Record<string, string> | null
  /** Files that came along, by field; only where the route takes some. */
  files: Record<string, SentFile>
  /** Business time. */
  now: Date
  /** The workshop named in the path; absent where the path names none. */
  workshop: { id: string; slug: string; currency: string; timeZone: string; country: string }
  request: Request
  /** Headers to send along with whatever is answered (a cookie, say). */
  answer: Headers
}

type FormAnswer<P, B> = {
  /** Names the form in the kept draft. */
  name: string
  /** The page that shows the form again; `draft` names what was typed. */
  back: (context: { params: P; body: Record<string, unknown>; draft: string }) => string
  /** Where a person goes once it is done. */
  done: (context: { params: P; body: B; value: unknown }) => string
  /** Turns fields into the body where the dotted names are not enough (rows left at zero, say). */
  reads?: (body: Record<string, unknown>) => unknown
}

type Spec<P, Q, B> = {
  /** Looked up in lib/core/policy before the body runs; absent for what anyone may do. */
  deed?: Deed
  /** Whether somebody must be signed in (implied by a deed that visitors lack). */
  signedIn?: boolean
  params?: z.ZodType<P>
  query?: z.ZodType<Q>
  body?: z.ZodType<B>
  limit?: LimitName
  /** Takes files: so many bytes, the form's other fields included. */
  upload?: number
  /** Takes an Idempotency-Key: the same key and body give the same answer once. */
  idempotent?: boolean
  /** Status of a success with a value; 200 unless said. */
  status?: number
  form?: FormAnswer<P, B>
}

type Answer = Response | Result<unknown, string> | FieldRefusal
type Segment = { params?: Promise<Record<string, string | string[] | undefined>> }

/**
 * The one wrapper of a route handler: origin, session, rate limit, deed, input, then the body; a refusal becomes a
 * status from one map and a bug a 500 with an id and one log line. A plain HTML form is answered by redirects (303):
 * on to the next page, or back to the form with what was typed.
 */
export function route<P = Record<string, string>, Q = unknown, B = unknown>(
  spec: Spec<P, Q, B>,
  run: (context: RouteContext<P, Q, B>) => Promise<Answer>,
) {
  return async (request: Request, segment: Segment): Promise<Response> => {
    const requestId = request.headers.get('x-request-id') ?? randomUUID()
    try {
      // A route without a parameter is handed none at all.
      const params = (await segment.params) ?? {}
      const answer = await answerOf(spec, run, request, params)
      answer.headers.set('x-request-id', requestId)
      return answer
    } catch (error) {
      log().error({ error, requestId, path: new URL(request.url).pathname }, 'request failed')
      return bug(requestId)
    }
  }
}

async function answerOf<P, Q, B>(
  spec: Spec<P, Q, B>,
  run: (context: RouteContext<P, Q, B>) => Promise<Answer>,
  request: Request,
  rawParams: Record<string, unknown>,
): Promise<Response> {
  const isChange = request.method !== 'GET' && request.method !== 'HEAD'
  const { actor, hasSession } = await actorOf(request)
  if (isChange && !isOwnOrigin(request, hasSession)) return problem('wrong_origin')

  const limit = spec.limit ?? (isChange ? 'change' : 'read')
  const wait = await waitFor(limit, limitKey(actor, request))
  if (wait > 0) return problem('too_many', { headers: { 'retry-after': String(wait) } })

  const params = spec.params?.safeParse(rawParams)
  if (params && !params.success) return problem('not_found')
  const workshop = typeof rawParams.workshop === 'string' ? await findWorkshop(rawParams.workshop) : null

  const needsSession = spec.signedIn || (spec.deed !== undefined && !can({ kind: 'visitor' }, spec.deed, {}))
  if (needsSession && actor.kind === 'visitor') return notSignedIn(request)
  if (rawParams.workshop !== undefined && !workshop) return problem('not_found')
  const scope = {
    ...(workshop && { workshopId: workshop.id }),
    ...(actor.kind === 'person' && { personId: actor.personId }),
  }
  if (spec.deed && !can(actor, spec.deed, scope)) return problem('forbidden')

  const read = isChange ? await readBody(request, spec.upload) : null
  if (read && !read.ok) return problem(read.reason)
  const now = await clock.now()
  const carried = read?.value ?? { body: {}, fields: null, errors: {}, text: '', files: {} }
  const shaped =
    carried.fields && spec.form?.reads
      ? spec.form.reads(carried.body as Record<string, unknown>)
      : carried.body
  const back = (reason: string, errors: Record<string, string> = {}) =>
    refused(spec, request, params?.data ?? (rawParams as P), carried, reason, errors)

  if (spec.deed && needsSecondFactor(spec.deed) && !secondFactorFresh(actor, new Date())) {
    if (wantsPage(request, carried)) return seeOther(paths.secondFactor(refererPath(request)))
    return problem('second_factor')
  }
  const body = spec.body?.safeParse(shaped)
  if (body && (!body.success || Object.keys(carried.errors).length > 0))
    return back('invalid', { ...(body.success ? {} : sentences(body.error)), ...carried.errors })
  const query = spec.query?.safeParse(Object.fromEntries(new URL(request.url).searchParams))
  if (query && !query.success) return problem('invalid', { errors: sentences(query.error) })

  const context = {
    actor,
    now,
    request,
    answer: new Headers(),
    params: params?.data ?? (rawParams as P),
    query: query?.data as Q,
    body: (body?.data ?? shaped) as B,
    fields: carried.fields,
    files: carried.files,
    workshop: workshop as RouteContext<P, Q, B>['workshop'],
  }
  const key = spec.idempotent ? requestKeyOf(request, carried) : null
  const held = key
    ? await takeRequestKey(key, `${limitKey(actor, request)} ${new URL(request.url).pathname}`, carried.text)
    : null
  if (held?.state === 'refused') return problem(held.reason)
  if (held?.state === 'replay') {
    const value = JSON.parse(held.body) as unknown
    return wantsPage(request, carried)
      ? seeOther(spec.form!.done({ params: context.params, body: context.body, value }))
      : json(value, held.status)
  }
  let answer: Response
  try {
    const outcome = await run(context)
    if (outcome instanceof Response) answer = outcome
    else if (outcome.ok) answer = succeeded(spec, request, carried, context, outcome.value)
    else answer = await back(outcome.reason, 'errors' in outcome ? outcome.errors : {})
    if (held?.state === 'fresh' && !(outcome instanceof Response))
      await settleRequestKey(
        held.row,
        outcome.ok ? json(outcome.value, spec.status ?? 200) : problem(outcome.reason),
      )
  } catch (error) {
    if (held?.state === 'fresh') await held.row.destroy()
    throw error
  }
  context.answer.forEach((value, name) => answer.headers.append(name, value))
  return answer
}

function succeeded<P, Q, B>(
  spec: Spec<P, Q, B>,
  request: Request,
  carried: ReadBody,
  context: RouteContext<P, Q, B>,
  value: unknown,
): Response {
  const next = spec.form?.done({ params: context.params, body: context.body, value })
  if (next !== undefined && wantsPage(request, carried)) return seeOther(next)
  const answer = json(value, spec.status ?? 200)
  // A form sent by script learns from this header where a person goes next.
  if (next !== undefined && carried.fields) answer.headers.set('x-next', next)
  return answer
}

async function refused<P, Q, B>(
  spec: Spec<P, Q, B>,
  request: Request,
  params: P,
  carried: ReadBody,
  reason: string,
  errors: Record<string, string>,
): Promise<Response> {
  if (!spec.form || !carried.fields || !wantsPage(request, carried)) return problem(reason, { errors })
  const draft = await keepDraft({ form: spec.form.name, fields: carried.fields, errors, reason })
  return seeOther(spec.form.back({ params, body: carried.body as Record<string, unknown>, draft }))
}

const json = (value: unknown, status: number) =>
  Response.json(value, { status, headers: { 'cache-control': 'no-store' } })
const seeOther = (location: string) =>
  new Response(null, { status: 303, headers: { location, 'cache-control': 'no-store' } })

function bug(requestId: string): Response {
  const answer = problem('bug', { requestId })
  return new Response(answer.body, { status: 500, headers: answer.headers })
}

function notSignedIn(request: Request): Response {
  const asksForPage = (request.headers.get('accept') ?? '').includes('text/html')
  return asksForPage ? seeOther(paths.signIn(refererPath(request))) : problem('not_signed_in')
}

/** Whether a browser without script sent this form and waits for a page. */
function wantsPage(request: Request, carried: ReadBody): boolean {
  return carried.fields !== null && (request.headers.get('accept') ?? '').includes('text/html')
}

function refererPath(request: Request): string | undefined {
  const referer = request.headers.get('referer')
  return referer && URL.canParse(referer) ? new URL(referer).pathname : undefined
}

function requestKeyOf(request: Request, carried: ReadBody): string | null {
  const key = request.headers.get('idempotency-key') ?? carried.fields?.idempotencyKey ?? null
  return key && key.length <= 200 ? key : null
}

function limitKey(actor: Actor, request: Request): string {
  if (actor.kind === 'person') return actor.personId
  return request.headers.get('x-forwarded-for')?.split(',')[0]?.trim() ?? 'visitor'
}

async function findWorkshop(slug: string) {
  return Workshop.findOne({ where: { slug }, attributes: ['id', 'slug', 'currency', 'timeZone', 'country'] })
}

/** The first sentence per field, by its dotted path. */
function sentences(error: z.ZodError): Record<string, string> {
  const found: Record<string, string> = {}
  for (const issue of error.issues) found[issue.path.join('.')] ??= issue.message
  return found
}
