type Handler = (request: Request, segment: { params: Promise<Record<string, string>> }) => Promise<Response>

type Sent = { params?: Record<string, string>; headers?: Record<string, string> }
const ORIGIN = 'http://localhost:3000'

const send = (handler: Handler, path: string, body: string, type: string, { params = {}, headers }: Sent) =>
  handler(
    new Request(`${ORIGIN}${path}`, {
      method: 'POST',
      headers: { 'content-type': type, origin: ORIGIN, ...headers },
      body,
    }),
    { params: Promise.resolve(params) },
  )

/** As a script sends it. */
export const postJson = (handler: Handler, path: string, body: unknown, sent: Sent = {}) =>
  send(handler, path, JSON.stringify(body), 'application/json', sent)

/** As a browser without script sends a form. */
export const postForm = (handler: Handler, path: string, fields: Record<string, string>, sent: Sent = {}) =>
  send(handler, path, new URLSearchParams(fields).toString(), 'application/x-www-form-urlencoded', {
    ...sent,
    headers: { accept: 'text/html', ...sent.headers },
  })
