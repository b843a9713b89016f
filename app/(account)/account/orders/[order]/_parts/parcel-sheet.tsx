import { When } from '@/components/format/when'
import { CopyText } from '@/components/ui/copy-text'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { orderWords as words } from '@/lib/messages/order-page'

/** Parcels of the order with their tracking numbers; nothing before there is one. */
export function ParcelSheet({ order }: { order: OrderPageView }) {
  if (order.parcels.length === 0) return null
  return (
    <Sheet title={words.parcels} id="parcels">
      <Facts
        facts={order.parcels.map((parcel, index) => ({
          key: String(index),
          name: parcel.service ?? words.parcelStates[parcel.state] ?? parcel.state,
          value: (
            <>
              {parcel.service ? `${words.parcelStates[parcel.state] ?? parcel.state} ` : ''}
              {parcel.handedOverAt ? <When at={parcel.handedOverAt} zone={order.timeZone} /> : null}
              {parcel.tracking ? (
                <span className="block">
                  {words.tracking}: <CopyText text={parcel.tracking} label={words.tracking} />
                </span>
              ) : parcel.handedOverAt ? (
                <span className="block text-quiet">{words.noTracking}</span>
              ) : null}
            </>
          ),
        }))}
      />
    </Sheet>
  )
}
