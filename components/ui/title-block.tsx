import { ui } from '@/lib/messages/ui'

export type TitleBlockProps = {
  what: React.ReactNode
  revision?: React.ReactNode
  who?: React.ReactNode
  when?: React.ReactNode
  sheet?: { number: number; of: number }
}

/** The block at the foot of a sheet and of each printed paper: what, revision, who, when, sheet n of m. */
export function TitleBlock({ what, revision, who, when, sheet }: TitleBlockProps) {
  const cells = [
    { name: ui.what, value: what, grow: true },
    { name: ui.revision, value: revision },
    { name: ui.who, value: who },
    { name: ui.when, value: when },
    { name: ui.sheet, value: sheet ? ui.sheetOf(sheet.number, sheet.of) : undefined },
  ].filter((cell) => cell.value !== undefined && cell.value !== null)
  return (
    <dl className="keep-together border-ink text-13 flex flex-wrap border-t">
      {cells.map((cell) => (
        <div
          key={cell.name}
          className={`border-rule -mb-px -ml-px border-b border-l px-3 pt-1 pb-1.5 ${cell.grow ? 'grow' : ''}`}
        >
          <dt className="text-quiet">{cell.name}</dt>
          <dd className="font-semibold">{cell.value}</dd>
        </div>
      ))}
    </dl>
  )
}
