import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { hashToken, makeToken } from '@/lib/config/secrets'
import { type Person, Session, User } from '@/models'

type Handler = (
  request: Request,
  segment: { params: Promise<Record<string, string | string[] | undefined>> },
) => Promise<Response>

export async function cookieFor(person: Person): Promise<string> {
  const user = await User.findOne({ where: { personId: person.id }, rejectOnEmpty: true })
  const token = makeToken()
  await Session.create({
    userId: user.id,
    tokenHash: hashToken(token),
    createdAt: new Date(),
    expiresAt: new Date(Date.now() + 3_600_000),
  })
  return `${SESSION_COOKIE}=${token}`
}

type Sent = {
  method?: string
  cookie?: string
  json?: unknown
  form?: Record<string, string>
  headers?: Record<string, string>
  params?: Record<string, string>
}

/** Calls a route handler as a browser of ours would; `form` as one without script. */
export function call(handler: Handler, path: string, sent: Sent = {}): Promise<Response> {
  const { method = 'POST', cookie, json, form, headers = {}, params = {} } = sent
  const body = form ? new URLSearchParams(form).toString() : json === undefined ? null : JSON.stringify(json)
  const type = form ? 'application/x-www-form-urlencoded' : 'application/json'
  const request = new Request(`http://localhost:3000${path}`, {
    method,
    headers: {
      origin: 'http://localhost:3000',
      ...(body === null ? {} : { 'content-type': type }),
      ...(form ? { accept: 'text/html' } : {}),
      ...(cookie === undefined ? {} : { cookie }),
      ...headers,
    },
    body,
  })
  return handler(request, { params: Promise.resolve(params) })
}
