import { DayText } from '@/components/format/day-text'
import { Table } from '@/components/ui/table'
import type { OfferKind } from '@/lib/contracts/fields'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

const day = (on: string | null) => (on === null ? words.missing : <DayText day={on} />)

/** The lines of a parts list with what the readiness list asks of them. */
export function PartsTable({ slug, module, parts }: { slug: string; module: string; parts: PartsDesk }) {
  const here = `${paths.adminModulePage(slug, module, 'parts')}?revision=${parts.revision}`
  return (
    <Table
      caption={`${words.table}, ${words.revision.toLowerCase()} ${parts.revision}`}
      rows={parts.lines}
      rowKey={(row) => row.id}
      empty={words.none}
      {...(parts.from > 0 && { firstHref: here })}
      {...(parts.next !== null && { nextHref: `${here}&from=${parts.next}` })}
      columns={[
        {
          key: 'code',
          heading: words.code,
          cell: (row) => <a href={paths.adminPart(slug, module, row.partId)}>{row.code}</a>,
        },
        { key: 'value', heading: words.value, cell: (row) => row.value },
        { key: 'designators', heading: words.designators, cell: (row) => row.designators },
        { key: 'perUnit', heading: words.perUnit, kind: 'figures', cell: (row) => row.perUnit },
        {
          key: 'placed',
          heading: words.placedBy,
          cell: (row) =>
            Object.entries(row.placedBy)
              .map(([offer, who]) => `${offerWords[offer as OfferKind]}: ${words.placers[who]}`)
              .join(', '),
        },
        { key: 'onHand', heading: words.onHand, kind: 'figures', cell: (row) => row.onHand },
        { key: 'quoted', heading: words.quotedOn, cell: (row) => day(row.quotedOn) },
        { key: 'stock', heading: words.stockSeenOn, cell: (row) => day(row.stockSeenOn) },
        { key: 'sample', heading: words.sample, cell: (row) => words.samples[row.sample] },
      ]}
    />
  )
}
