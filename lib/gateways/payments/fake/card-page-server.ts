import 'server-only'
import { createServer, type IncomingMessage, type Server } from 'node:http'
import { log } from '@/lib/config/log'
import { postBankAnswer, showBankPage } from '@/lib/gateways/payments/fake/pages/bank-page'
import { postCard, showCardPage } from '@/lib/gateways/payments/fake/pages/card-page'
import { type Page, page } from '@/lib/gateways/payments/fake/pages/layout'
import { postOnboarding, showOnboarding } from '@/lib/gateways/payments/fake/pages/onboarding-page'

const MOST_BYTES = 16_384

async function formOf(request: IncomingMessage): Promise<URLSearchParams | null> {
  const parts: Buffer[] = []
  let bytes = 0
  for await (const part of request as AsyncIterable<Buffer>) {
    bytes += part.length
    if (bytes > MOST_BYTES) return null
    parts.push(part)
  }
  return new URLSearchParams(Buffer.concat(parts).toString('utf8'))
}

const NOT_FOUND = () =>
  page({ status: 404, title: 'Nothing here', body: '<p>The card page is reached from an order.</p>' })

async function answer(request: IncomingMessage): Promise<Page> {
  const { pathname } = new URL(request.url ?? '/', 'http://card.page')
  if (pathname === '/health') return { status: 200, html: 'ok', headers: { 'content-type': 'text/plain' } }
  const [, place, id] = /^\/(pay|authenticate|onboarding)\/(\w+)$/.exec(pathname) ?? []
  if (place === undefined || id === undefined) return NOT_FOUND()
  if (request.method === 'GET' || request.method === 'HEAD') {
    if (place === 'pay') return showCardPage(id)
    return place === 'authenticate' ? showBankPage(id) : showOnboarding(id)
  }
  if (request.method !== 'POST') return page({ status: 405, title: 'Not possible', body: '' })
  const form = await formOf(request)
  if (form === null) return page({ status: 413, title: 'Too much', body: '<p>That was no card number.</p>' })
  if (place === 'pay') return postCard(id, form.get('number') ?? '')
  if (place === 'authenticate') return postBankAnswer(id, form.get('answer') === 'yes')
  return postOnboarding(id, form.get('then') ?? '')
}

/** The provider's pages of the sandbox: card page, bank's question, onboarding. Listens on loopback only. */
export async function startCardPage(port: number): Promise<Server> {
  const server = createServer((request, response) => {
    answer(request)
      .catch((error: unknown) => {
        log().error({ error }, 'card page failed')
        return page({ status: 500, title: 'Something went wrong', body: '<p>Try again in a moment.</p>' })
      })
      .then(({ status, headers, html }) => {
        response.writeHead(status, headers)
        response.end(request.method === 'HEAD' ? undefined : html)
      })
      .catch((error: unknown) => log().warn({ error }, 'card page answer lost'))
  })
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(port, '127.0.0.1', resolve)
  })
  return server
}
