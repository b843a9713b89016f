import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'

const MARKS = { added: 'done', removed: 'stopped', changed: 'attention' } as const
const MOST_SHOWN = 200

/** The difference between the list there is and the one in the file. */
export function ChangesSheet({ preview: { changes, unchanged } }: { preview: ImportPreview }) {
  const count = (what: keyof typeof MARKS) => changes.filter((each) => each.what === what).length
  return (
    <Sheet title={words.changes} id="changes">
      <p className="max-w-words pb-3">
        {words.changesSum(count('added'), count('removed'), count('changed'), unchanged)}
        {changes.length > MOST_SHOWN ? ` ${words.tooManyChanges(MOST_SHOWN, changes.length)}` : ''}
      </p>
      <Table
        caption={words.changesCaption}
        captionHidden
        rows={changes.slice(0, MOST_SHOWN)}
        rowKey={({ code, what }) => `${code} ${what}`}
        empty={words.noChanges}
        columns={[
          { key: 'code', heading: words.part, cell: ({ code }) => code },
          {
            key: 'what',
            heading: words.change,
            cell: ({ what, fields }) => (
              <>
                <StateMark kind={MARKS[what]}>{words.what[what]}</StateMark>
                {fields.map(({ name, before, after }) => (
                  <span key={name} className="block text-15 text-quiet">
                    {words.field(name, before, after)}
                  </span>
                ))}
              </>
            ),
          },
        ]}
      />
    </Sheet>
  )
}
