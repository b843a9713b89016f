import { Contents } from '@/components/parcel/contents'
import { Table } from '@/components/ui/table'
import { withParams } from '@/components/ui/with-params'
import type { PackGroup, QueueQuery } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { TakeButton } from './take-button'

type Props = { slug: string; query: QueueQuery; groups: PackGroup[] }

/** What is the same in many orders, so that it is laid out once. */
export function GroupsTable({ slug, query, groups }: Props) {
  const show = (group: string) => withParams(paths.packing(slug), query, { group, after: null })
  return (
    <Table<PackGroup>
      caption={words.groups.caption}
      rows={groups}
      rowKey={(row) => row.group}
      empty={words.groups.empty}
      columns={[
        { key: 'contents', heading: words.groups.contents, cell: (row) => <Contents lines={row.lines} /> },
        { key: 'count', heading: words.groups.count, kind: 'figures', cell: (row) => row.count },
      ]}
      actions={(row) => (
        <span className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <a href={show(row.group)}>{words.groups.show}</a>
          <TakeButton slug={slug} query={query} group={row} />
        </span>
      )}
    />
  )
}
