import { When } from '@/components/format/when'
import { Weight } from '@/components/format/weight'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { PackedParcel } from '@/lib/contracts/packing'
import { countryName } from '@/lib/core/data/country'
import type { Actor } from '@/lib/core/policy/can'
import { businessNow } from '@/lib/http/business-now'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { listPackedParcels } from '@/lib/queries/packing/list-packed-parcels'

type Props = {
  actor: Actor
  workshopId: string
  slug: string
  show: 'packed' | 'handed_over'
  after?: string
  /** Only those of this batch. */
  batch?: string
  zone: string
}

/** Parcels that wait to be handed over, or that were. */
export async function PackedSheet({ actor, workshopId, slug, show, after, batch, zone }: Props) {
  const from = /^\d{1,9}$/.test(after ?? '') ? Number(after) : undefined
  const { items, next } = await listPackedParcels({
    actor,
    workshopId,
    show,
    after: from,
    batch,
    now: await businessNow(),
  })
  const here = (mark: string | null) => withParams(paths.packing(slug), { show }, { after: mark })
  const isPacked = show === 'packed'
  return (
    <Table<PackedParcel>
      caption={words.table[show]}
      rows={items}
      rowKey={(row) => row.parcel}
      empty={words.empty[show]}
      firstHref={from === undefined ? undefined : here(null)}
      nextHref={next === null ? undefined : here(String(next))}
      columns={[
        {
          key: 'order',
          heading: words.order,
          cell: (row) => <a href={paths.packingParcel(slug, row.parcel)}>{row.orderNumber}</a>,
        },
        {
          key: 'to',
          heading: words.to,
          cell: (row) => [row.name, countryName(row.country)].filter(Boolean).join(', '),
        },
        { key: 'grams', heading: words.weight, kind: 'figures', cell: (row) => <Weight grams={row.grams} /> },
        ...(isPacked
          ? []
          : [
              { key: 'service', heading: words.service, cell: (row: PackedParcel) => row.service },
              { key: 'tracking', heading: words.tracking, cell: (row: PackedParcel) => row.tracking ?? '–' },
              {
                key: 'when',
                heading: words.when,
                cell: (row: PackedParcel) => <When at={row.at} zone={zone} />,
              },
            ]),
      ]}
      actions={(row) => (
        <a href={paths.packingParcel(slug, row.parcel)}>{isPacked ? words.handOver : words.look}</a>
      )}
    />
  )
}
