import 'server-only'
import Stripe from 'stripe'

/** The key that means: no provider, the fake answers. No real key looks like it. */
export const SANDBOX_KEY = 'sk_test_brimline_sandbox'

/** Whom the SDK talks to. */
export type ClientSettings = {
  readonly secretKey: string
  /** Another server that speaks the provider's API, such as 'http://127.0.0.1:12111'; only with a test key. */
  readonly apiBase?: string | undefined
}

/** The fake is loaded at the first call, so that a live deployment never loads it. */
async function fakeFetch(input: RequestInfo | URL, init?: RequestInit): Promise<Response> {
  const fake = await import('@/lib/gateways/payments/fake/fake-fetch')
  return fake.fakeFetch(input, init)
}

function elsewhere(apiBase: string | undefined): {
  host?: string
  port?: string
  protocol?: 'http' | 'https'
} {
  if (apiBase === undefined) return {}
  const url = new URL(apiBase)
  const protocol = url.protocol === 'http:' ? 'http' : 'https'
  return {
    host: url.hostname,
    port: url.port === '' ? (protocol === 'http' ? '80' : '443') : url.port,
    protocol,
  }
}

/**
 * The SDK as we use it: 10 s a try, two repeats by the SDK with the same key, no telemetry.
 * With `SANDBOX_KEY` the same SDK talks to the fake inside the process.
 */
export function stripeClient({ secretKey, apiBase }: ClientSettings): Stripe {
  const isFake = secretKey === SANDBOX_KEY && apiBase === undefined
  return new Stripe(secretKey, {
    maxNetworkRetries: 2,
    timeout: 10_000,
    telemetry: false,
    ...elsewhere(apiBase),
    // The framework replaces the global fetch by a caching one, so the real provider is reached by node's own client.
    httpClient: isFake ? Stripe.createFetchHttpClient(fakeFetch) : Stripe.createNodeHttpClient(),
  })
}
