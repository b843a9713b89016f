import 'server-only'
import { clock } from '@/lib/gateways/clock'

/** Business time for a page; a route handler is handed it. */
export const businessNow = (): Promise<Date> => clock.now()
