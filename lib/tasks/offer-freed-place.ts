import 'server-only'
import { clock } from '@/lib/gateways/clock'
import type { Task } from '@/lib/jobs/task'
import { offerFreedPlace } from '@/lib/services/orders/offer-freed-place'

/** Places were given back: whoever waits is asked. */
export const offerFreedPlaceJob: Task<'offer_freed_place'> = async ({ runId }) => {
  await offerFreedPlace({ runId, now: await clock.now() })
}
