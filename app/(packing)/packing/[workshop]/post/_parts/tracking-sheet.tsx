import { Button } from '@/components/ui/button'
import { keptForm } from '@/components/forms/kept-form'
import { DeedForm, Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import { Table } from '@/components/ui/table'
import { TextArea } from '@/components/ui/text-area'
import type { TrackingRow } from '@/lib/contracts/tracking'
import { packingWords } from '@/lib/messages/packing'
import { postWords } from '@/lib/messages/post'
import { paths } from '@/lib/paths'

const words = postWords.tracking

type Props = {
  slug: string
  kept: { values: Record<string, string>; errors: Record<string, string>; reason: string } | null
  /** What the pasted list would do; null before it was read. */
  rows: TrackingRow[] | null
}

/** The carrier's list: pasted, looked at line by line, then taken in. */
export function TrackingSheet({ slug, kept, rows }: Props) {
  const action = paths.api.packingTracking(slug)
  const form = rows ? { values: kept?.values } : keptForm(kept)
  const good = rows?.filter(({ mistake }) => mistake === null).length ?? 0
  return (
    <Sheet title={words.title} id="tracking">
      {rows ? (
        <div className="pb-6">
          <p className="pb-3 text-17">{words.preview(good, rows.length - good)}</p>
          <Preview rows={rows} />
          {good > 0 ? (
            <div className="pt-3">
              <DeedForm action={action} hidden={{ csv: kept?.values.csv ?? '', confirmed: 'on' }}>
                <Button>{words.apply(good)}</Button>
              </DeedForm>
            </div>
          ) : (
            <p className="pt-3 text-rust">{words.none}</p>
          )}
        </div>
      ) : null}
      <Form action={action} form={form} foot={<Button kind="secondary">{words.look}</Button>}>
        <TextArea
          name="csv"
          label={words.field}
          hint={words.hint}
          form={form}
          rows={8}
          className="figures"
          spellCheck={false}
        />
      </Form>
    </Sheet>
  )
}

function Preview({ rows }: { rows: TrackingRow[] }) {
  return (
    <Table<TrackingRow>
      caption={words.caption}
      rows={rows}
      rowKey={(row) => String(row.line)}
      empty=""
      columns={[
        { key: 'line', heading: words.line, cell: (row) => row.line },
        { key: 'order', heading: words.order, cell: (row) => row.order },
        {
          key: 'number',
          heading: words.number,
          cell: (row) =>
            row.tracking === null ? (
              '–'
            ) : (
              <>
                <span className="figures">{row.tracking}</span>{' '}
                <span className="text-13 text-quiet">
                  {row.kind === 's10' ? words.verified : words.notVerifiable}
                </span>
              </>
            ),
        },
        {
          key: 'state',
          heading: words.state,
          cell: (row) => (row.state === null ? '–' : packingWords.states[row.state]),
        },
        {
          key: 'verdict',
          heading: words.verdict,
          cell: (row) =>
            row.mistake === null ? (
              <StateMark kind="done">{words.taken}</StateMark>
            ) : (
              <StateMark kind="stopped">{row.mistake}</StateMark>
            ),
        },
      ]}
    />
  )
}
