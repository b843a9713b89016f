import 'server-only'
import { getResponse } from 'msw'
import { SandboxBug } from '@/lib/gateways/payments/fake/errors'
import { HANDLERS } from '@/lib/gateways/payments/fake/handlers'

/** Settles as `work` does, or rejects as soon as the caller gives up: else the SDK's time limit would hang for good. */
function orAborted<T>(work: Promise<T>, signal: AbortSignal | null | undefined): Promise<T> {
  if (!signal) return work
  return new Promise((resolve, reject) => {
    const giveUp = () => reject(signal.reason)
    if (signal.aborted) return giveUp()
    signal.addEventListener('abort', giveUp, { once: true })
    work.then(resolve, reject).finally(() => signal.removeEventListener('abort', giveUp))
  })
}

/**
 * Stands in for `fetch` towards the provider: msw handlers answer, the network is never reached.
 * Throws for a route nobody handles.
 */
export async function fakeFetch(input: RequestInfo | URL, init?: RequestInit): Promise<Response> {
  const { signal, ...rest } = init ?? {}
  const request = new Request(input, rest)
  const response = await orAborted(getResponse(HANDLERS, request), signal)
  if (response === undefined)
    throw new SandboxBug(`the sandbox has no route ${request.method} ${request.url}`)
  // msw answers `HttpResponse.error()` as a response of type error; to a caller of fetch it is a lost connection.
  if (response.type === 'error') throw new TypeError('fetch failed')
  return response
}
