import { env } from '@/lib/config/env'
import { startCardPage } from '@/lib/gateways/payments/fake/card-page-server'
import { closeSandboxPool } from '@/lib/gateways/payments/fake/pool'
import { runProvider } from '@/lib/gateways/payments/fake/provider-loop'

// The sandbox's payment provider: its card page on the second loopback port, and the events it sends.

const { SANDBOX, CARD_PAGE_URL } = env()
if (!SANDBOX || CARD_PAGE_URL === undefined) {
  console.error('The sandbox provider runs only while SANDBOX is 1 and CARD_PAGE_URL is set.')
  process.exit(1)
}

const ending = new AbortController()
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => ending.abort())

const server = await startCardPage(Number(new URL(CARD_PAGE_URL).port || 80))
console.log(`card page: ${CARD_PAGE_URL} (sandbox, no real money)`)
console.log('ready')
await runProvider(ending.signal)
server.close()
server.closeAllConnections()
await closeSandboxPool()
