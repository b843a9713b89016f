import { Table } from '@/components/ui/table'
import type { RevisionDesk } from '@/lib/contracts/module-desk'
import { dayIn } from '@/lib/core/time/zone'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { writtenDay } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; revisions: RevisionDesk[]; zone: string }

/** Each version of the electronics, newest first. */
export function RevisionsTable({ slug, module, revisions, zone }: Props) {
  const parts = paths.adminModulePage(slug, module, 'parts')
  return (
    <Table
      caption={words.revisions}
      rows={revisions}
      rowKey={(row) => row.letter}
      empty={words.noRevision}
      columns={[
        { key: 'letter', heading: words.revision, cell: (row) => row.letter },
        { key: 'state', heading: words.state, cell: (row) => words.revisionStates[row.state] },
        { key: 'note', heading: words.note, cell: (row) => row.note },
        {
          key: 'good',
          heading: words.firstGood,
          cell: ({ firstGood }) =>
            firstGood
              ? words.firstGoodWords(writtenDay(dayIn(new Date(firstGood.at), zone)), firstGood.by ?? '')
              : words.firstGoodNone,
        },
        {
          key: 'parts',
          heading: words.partsCount,
          kind: 'figures',
          cell: (row) => <a href={`${parts}?revision=${row.letter}`}>{row.parts}</a>,
        },
      ]}
    />
  )
}
