import { Money } from '@/components/format/money'
import { Weight } from '@/components/format/weight'
import { Table } from '@/components/ui/table'
import type { ModuleDesk } from '@/lib/contracts/module-desk'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

type Props = { slug: string; desk: ModuleDesk; currency: string }

/** The forms in which a module is sold, at a glance. */
export function OffersTable({ slug, desk, currency }: Props) {
  const here = paths.adminModulePage(slug, desk.module.slug, 'offers')
  const amount = (minor: number | null) =>
    minor === null ? words.priceOpen : <Money minor={minor} currency={currency} />
  return (
    <Table
      caption={words.overviewTable}
      captionHidden
      rows={desk.offers.filter(({ withdrawn }) => !withdrawn)}
      rowKey={(row) => row.offer}
      empty={words.noOffers}
      columns={[
        {
          key: 'offer',
          heading: words.offer,
          cell: (row) => <a href={`${here}?offer=${row.offer}`}>{offerWords[row.offer]}</a>,
        },
        { key: 'price', heading: words.price, kind: 'figures', cell: (row) => amount(row.priceMinor) },
        { key: 'deposit', heading: words.deposit, kind: 'figures', cell: (row) => amount(row.depositMinor) },
        {
          key: 'packed',
          heading: words.packed,
          kind: 'figures',
          cell: (row) => (row.packedWeightG === null ? words.notSet : <Weight grams={row.packedWeightG} />),
        },
        {
          key: 'to',
          heading: words.postedTo,
          kind: 'figures',
          cell: (row) => words.countries(row.destinations),
        },
      ]}
    />
  )
}
