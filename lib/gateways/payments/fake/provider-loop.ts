import 'server-only'
import { setTimeout as pause } from 'node:timers/promises'
import { log } from '@/lib/config/log'
import { deliverDueEvents } from '@/lib/gateways/payments/fake/deliver'
import { passTime } from '@/lib/gateways/payments/fake/pass-time'

const LOOK_EVERY_MS = 40
const TIME_EVERY_MS = 500

/** What the provider does by itself: time passes, events go out. Ends when the signal is given. */
export async function runProvider(signal: AbortSignal): Promise<void> {
  let lastTime = 0
  let wasLost = false
  while (!signal.aborted) {
    try {
      if (Date.now() - lastTime >= TIME_EVERY_MS) {
        lastTime = Date.now()
        await passTime()
      }
      await deliverDueEvents()
      wasLost = false
    } catch (error) {
      // The database restarts, or is not there yet: said once, tried again.
      if (!wasLost) log().warn({ error }, 'sandbox provider waits for its database')
      wasLost = true
      await pause(500, undefined, { signal }).catch(() => {})
    }
    await pause(LOOK_EVERY_MS, undefined, { signal }).catch(() => {})
  }
}
