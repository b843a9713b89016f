import { fieldsToBody } from '@/lib/contracts/form-fields'
import { OrderInput, readOrderForm } from '@/lib/contracts/orders'

/** The order a kept form stands for; null when it is none (any more). */
export function readDraft(values: Record<string, string>): OrderInput | null {
  const { body } = fieldsToBody(Object.entries(values))
  const read = OrderInput.safeParse(readOrderForm(body))
  return read.success ? read.data : null
}
