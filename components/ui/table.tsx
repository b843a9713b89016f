import { ui } from '@/lib/messages/ui'
import { classNames } from './class-names'
import { Empty } from './empty'
import { Paging } from './paging'

export type SortLink = { href: string; direction?: 'ascending' | 'descending' }

export type Column<Row> = {
  key: string
  heading: string
  cell: (row: Row) => React.ReactNode
  /** 'figures' stands on a common right edge, monospaced. */
  kind?: 'text' | 'figures'
  sort?: SortLink
}

type Props<Row> = {
  caption: React.ReactNode
  /** The caption is read out but not seen: the sheet's title says it already. */
  captionHidden?: boolean
  columns: readonly Column<Row>[]
  rows: readonly Row[]
  rowKey: (row: Row) => string
  /** What can be done with a row, in words. */
  actions?: (row: Row) => React.ReactNode
  /** What stands here when there are no rows: a sentence that says what to do next. */
  empty: React.ReactNode
  /** Fields that narrow the list, as a GET form. */
  filter?: React.ReactNode
  csvHref?: string
  firstHref?: string
  nextHref?: string
  /** Narrow screens: each row becomes a block ('stack'), or the table scrolls sideways ('scroll'). */
  narrow?: 'stack' | 'scroll'
}

/** A table with a caption, sortable headings and a state for having nothing to show. The first column names its row. */
export function Table<Row>(props: Props<Row>) {
  const {
    caption,
    captionHidden,
    columns,
    rows,
    rowKey,
    actions,
    empty,
    filter,
    csvHref,
    firstHref,
    nextHref,
  } = props
  const stack = props.narrow !== 'scroll'
  return (
    <div className={classNames('group/table', stack && 'stacks')}>
      {filter ? <div className="pb-3 print:hidden">{filter}</div> : null}
      {rows.length === 0 ? (
        <>
          {captionHidden ? null : <p className="text-13 text-quiet pb-2">{caption}</p>}
          <Empty>{empty}</Empty>
        </>
      ) : (
        <div
          className={stack ? undefined : 'relative overflow-x-auto'}
          {...(stack
            ? {}
            : {
                tabIndex: 0,
                role: 'region',
                'aria-label': typeof caption === 'string' ? caption : undefined,
              })}
        >
          <table role="table" className="text-15 w-full border-collapse">
            <caption className={captionHidden ? 'sr-only' : 'text-13 text-quiet pb-2 text-left'}>
              {caption}
            </caption>
            <thead role="rowgroup">
              <tr role="row">
                {columns.map((column) => (
                  <Heading key={column.key} column={column} />
                ))}
                {actions ? (
                  <th role="columnheader" scope="col" className="border-ink border-b print:hidden">
                    <span className="sr-only">{ui.actions}</span>
                  </th>
                ) : null}
              </tr>
            </thead>
            <tbody role="rowgroup">
              {rows.map((row) => (
                <tr key={rowKey(row)} role="row" className="border-rule border-b">
                  {columns.map((column, index) => (
                    <Cell key={column.key} column={column} row={row} named={index === 0} />
                  ))}
                  {actions ? (
                    <td role="cell" className="py-2 pl-3 text-right print:hidden">
                      <span className="bench:[&_a]:inline-flex bench:[&_a]:min-h-14 bench:[&_a]:items-center bench:[&_a]:px-3 inline-flex flex-wrap justify-end gap-x-4 gap-y-2">
                        {actions(row)}
                      </span>
                    </td>
                  ) : null}
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      <Paging firstHref={firstHref} nextHref={nextHref} csvHref={rows.length > 0 ? csvHref : undefined} />
    </div>
  )
}

const edge = (kind: string | undefined) => (kind === 'figures' ? 'text-right' : 'text-left')

function Heading<Row>({ column }: { column: Column<Row> }) {
  const { heading, sort, kind } = column
  return (
    <th
      role="columnheader"
      scope="col"
      aria-sort={sort?.direction}
      className={`border-ink text-13 border-b py-1.5 pr-4 align-bottom font-semibold last:pr-0 ${edge(kind)}`}
    >
      {sort ? (
        <a href={sort.href} className="text-ink inline-flex min-h-6 items-end gap-1 leading-5">
          <span className="sr-only">{ui.sortBy(heading)}</span> <span aria-hidden="true">{heading}</span>
          {sort.direction ? (
            <>
              <SortMark up={sort.direction === 'ascending'} />
              <span className="sr-only">
                ({sort.direction === 'ascending' ? ui.sortedUp : ui.sortedDown})
              </span>
            </>
          ) : null}
        </a>
      ) : (
        heading
      )}
    </th>
  )
}

function SortMark({ up }: { up: boolean }) {
  return (
    <svg viewBox="0 0 8 8" aria-hidden="true" className="mb-1.5 size-2">
      <path d={up ? 'M4 1 7 7H1Z' : 'M4 7 1 1H7Z'} fill="currentColor" />
    </svg>
  )
}

function Cell<Row>({ column, row, named }: { column: Column<Row>; row: Row; named: boolean }) {
  const className = `py-2.5 pr-4 align-top last:pr-0 ${edge(column.kind)}`
  const content = (
    <>
      <span aria-hidden="true" className="stack-label">
        {column.heading}
      </span>
      <span className={column.kind === 'figures' ? 'figures' : undefined}>{column.cell(row)}</span>
    </>
  )
  if (named)
    return (
      <th role="rowheader" scope="row" className={`${className} font-semibold`}>
        {content}
      </th>
    )
  return (
    <td role="cell" className={className}>
      {content}
    </td>
  )
}
