import { When } from '@/components/format/when'
import { Sheet } from '@/components/ui/sheet'
import { StoryList } from '@/components/ui/story-list'
import type { MarkKind } from '@/components/ui/state-mark'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { orderWords as words } from '@/lib/messages/order-page'

const GOOD = ['deposit_captured', 'late_capture', 'balance_captured', 'hand_over', 'parcel_handed_over']
const BAD = ['cancel', 'lapse', 'hold_ended', 'run_called_off', 'run_closed', 'cancel_with_right']

/** What happened to the order, newest first. */
export function StorySheet({ order }: { order: OrderPageView }) {
  return (
    <Sheet title={words.story} id="story">
      <StoryList
        happenings={[...order.history].reverse().map(({ at, event }, index) => ({
          key: `${at} ${event} ${index}`,
          when: <When at={at} zone={order.timeZone} />,
          words: words.events[event] ?? event,
          mark: markOf(event),
        }))}
      />
    </Sheet>
  )
}

const markOf = (event: string): MarkKind =>
  GOOD.includes(event) ? 'done' : BAD.includes(event) ? 'stopped' : 'open'
