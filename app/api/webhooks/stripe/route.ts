import { webhook } from '@/lib/http/webhook'
import { receiveProviderEvent } from '@/lib/services/payments/receive-provider-event'

export const POST = webhook(receiveProviderEvent)
