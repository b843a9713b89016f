import { Table } from '@/components/ui/table'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'

/** The lines as they are read, each with what is wrong with it. */
export function ImportTable({ preview }: { preview: ImportPreview }) {
  const { shown, shownHeadings } = preview
  if (shown.length === 0) return null
  return (
    <Table
      caption={words.preview}
      rows={shown}
      rowKey={({ line }) => String(line)}
      empty={words.nothing}
      narrow="scroll"
      columns={[
        { key: 'line', heading: words.lineHeading, kind: 'figures', cell: ({ line }) => line },
        {
          key: 'remark',
          heading: words.remark,
          cell: ({ words: sentences }) => (
            <span className="font-semibold text-rust">{sentences.join(' ')}</span>
          ),
        },
        ...shownHeadings.map((heading, i) => ({
          key: heading,
          heading,
          cell: ({ cells }: ImportPreview['shown'][number]) => cells[i] ?? '',
        })),
      ]}
    />
  )
}
