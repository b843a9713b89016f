import type { PaperTable } from '@/lib/papers/blocks'

const alignOf = (align?: 'left' | 'right') => (align === 'right' ? 'text-right figures' : 'text-left')

/** A table of a paper; scrolls sideways on a narrow screen, never on paper. */
export function PaperTableView({ table }: { table: PaperTable }) {
  return (
    <div className="overflow-x-auto py-2" tabIndex={0}>
      <table className="w-full text-15">
        <thead>
          <tr>
            {table.ticks ? <td className="w-6" /> : null}
            {table.columns.map(({ heading, align }) => (
              <th
                key={heading}
                scope="col"
                className={`px-1 text-13 font-normal text-quiet ${alignOf(align)}`}
              >
                {heading}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row, index) => (
            <tr key={index} className="border-t border-rule align-top">
              {table.ticks ? (
                <td className="py-1.5">
                  <span aria-hidden="true" className="inline-block size-4 border border-ink" />
                </td>
              ) : null}
              {row.map((cell, at) => (
                <td
                  key={at}
                  className={`px-1 py-1.5 whitespace-pre-line ${alignOf(table.columns[at]?.align)}`}
                >
                  {cell}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  )
}
