import { type MarkKind, StateMark } from '@/components/ui/state-mark'
import { orderWords } from '@/lib/messages/order-page'

const MARKS: Readonly<Record<string, MarkKind>> = {
  awaiting_deposit: 'attention',
  waiting: 'open',
  reserved: 'done',
  balance_due: 'attention',
  paid: 'done',
  packed: 'done',
  posted: 'done',
  cancelled: 'stopped',
  expired: 'stopped',
  lapsed: 'stopped',
  withdrawn: 'stopped',
  returned: 'stopped',
}

/** Where an order stands, as a mark and a word. */
export function OrderState({ state }: { state: string }) {
  return <StateMark kind={MARKS[state] ?? 'open'}>{orderWords.states[state] ?? state}</StateMark>
}
