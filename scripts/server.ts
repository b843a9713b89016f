import { randomUUID } from 'node:crypto'
import { createServer, type IncomingMessage, type ServerResponse } from 'node:http'
import next from 'next'
import { checkEnv, env } from '@/lib/config/env'
import { log } from '@/lib/config/log'
import { sequelize } from '@/lib/db/sequelize'
import { InFlight } from './support/in-flight'
import { listenForChanges } from './support/listen-for-changes'
import { setSecurityHeaders } from './support/security-headers'

// The web server: the framework behind a gate that turns requests away while it can still answer, request ids,
// security headers on every answer, and an end that lets the requests in hand finish.
const DRAIN_MS = 20_000

const problems = checkEnv()
if (problems.length > 0) {
  process.stderr.write(`${problems.join('\n')}\n`)
  process.exit(78)
}
const { PORT, NODE_ENV, MAX_IN_FLIGHT, DATABASE_URL } = env()
const isDev = NODE_ENV === 'development'

const app = next({ dev: isDev, hostname: '127.0.0.1', port: PORT })
await app.prepare()
const answer = app.getRequestHandler()
const inFlight = new InFlight(MAX_IN_FLIGHT)

const server = createServer((request, response) => {
  nameRequest(request, response)
  setSecurityHeaders(request, response)
  if (!inFlight.enter(request, response)) return turnAway(response)
  answer(request, response).catch((error: unknown) => {
    log().error({ error, requestId: request.headers['x-request-id'] }, 'request failed outside the framework')
    response.destroy()
  })
})
server.requestTimeout = 60_000
server.headersTimeout = 15_000
// Longer than a proxy in front keeps its side, so that it never sends into a closing connection.
server.keepAliveTimeout = 75_000
if (isDev) server.on('upgrade', app.getUpgradeHandler())

const listener = isDev ? undefined : listenForChanges(DATABASE_URL)
server.listen(PORT, '127.0.0.1', () => process.stdout.write('ready\n'))
server.on('error', (error) => {
  process.stderr.write(`The web server cannot listen on port ${PORT}: ${error.message}\n`)
  process.exit(1)
})

let isEnding = false
async function end() {
  if (isEnding) return
  isEnding = true
  const late = setTimeout(() => process.exit(1), DRAIN_MS)
  const closed = new Promise((resolve) => server.close(resolve))
  inFlight.closeWhenDone()
  server.closeIdleConnections()
  await closed
  clearTimeout(late)
  await listener?.close()
  await app.close()
  await sequelize.close()
  process.exit(0)
}
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void end())

/** An id from a proxy in front is kept when it is one; everything logged about the request carries it. */
function nameRequest(request: IncomingMessage, response: ServerResponse) {
  const given = request.headers['x-request-id']
  const id = typeof given === 'string' && /^[\w-]{8,64}$/.test(given) ? given : randomUUID()
  request.headers['x-request-id'] = id
  response.setHeader('X-Request-Id', id)
}

function turnAway(response: ServerResponse) {
  const body = { title: 'Too many requests at once. Try again in a moment.', status: 503 }
  response.writeHead(503, { 'Retry-After': '2', 'Content-Type': 'application/problem+json' })
  response.end(JSON.stringify(body))
}
