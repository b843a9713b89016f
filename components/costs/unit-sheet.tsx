import { Money } from '@/components/format/money'
import { Disclosure } from '@/components/ui/disclosure'
import { Notice } from '@/components/ui/notice'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { costWords as words } from '@/lib/messages/costs'

type Row = { key: string; name: string; amount: number }

/** An average unit taken apart, and every line of the run behind it. */
export function UnitSheet({ figures }: { figures: CostFigures }) {
  const { perUnit, units, lines, unpriced, currency, locale } = figures
  const sum = (minor: number) => <Money minor={minor} currency={currency} locale={locale} />
  const rows: Row[] = [
    { key: 'paid', name: words.paid, amount: perUnit.paid },
    ...(perUnit.tax === 0 ? [] : [{ key: 'tax', name: words.tax, amount: -perUnit.tax }]),
    { key: 'revenue', name: words.revenue, amount: perUnit.revenue },
    ...perUnit.costs.map(({ kind, amount }) => ({ key: kind, name: words.kinds[kind], amount: -amount })),
    { key: 'cost', name: words.cost, amount: -perUnit.cost },
    { key: 'left', name: words.left, amount: perUnit.profit },
  ]
  const isTotal = ({ key }: Row) => key === 'revenue' || key === 'cost' || key === 'left'
  return (
    <Sheet title={words.oneUnit} id="one-unit">
      {unpriced.length > 0 ? (
        <div className="pb-3">
          <Notice kind="attention" title={words.unpricedTitle}>
            <ul>
              {unpriced.map(({ kind, name, reason }) => (
                <li key={`${kind} ${name} ${reason}`}>{words.unpriced[reason](name)}</li>
              ))}
            </ul>
          </Notice>
        </div>
      ) : null}
      <Table
        caption={words.oneUnitCaption(units)}
        rows={rows}
        rowKey={(row) => row.key}
        empty={words.noPlan}
        narrow="scroll"
        columns={[
          {
            key: 'what',
            heading: words.line,
            cell: (row) => <span className={isTotal(row) ? undefined : 'font-normal'}>{row.name}</span>,
          },
          {
            key: 'amount',
            heading: words.perUnit,
            kind: 'figures',
            cell: (row) => (
              <span className={isTotal(row) ? 'font-semibold' : undefined}>{sum(row.amount)}</span>
            ),
          },
        ]}
      />
      <p className="py-2 text-13 text-quiet">{words.addsUp}</p>
      <Disclosure summary={words.everyLine}>
        <Table
          caption={words.everyLineCaption(units)}
          captionHidden
          rows={lines}
          rowKey={({ kind, name }) => `${kind} ${name}`}
          empty={words.noPlan}
          columns={[
            { key: 'name', heading: words.line, cell: ({ name, kind }) => name || words.kinds[kind] },
            { key: 'kind', heading: words.mover, cell: ({ kind }) => words.kinds[kind] },
            {
              key: 'amount',
              heading: words.wholeRun,
              kind: 'figures',
              cell: ({ amount }) => sum(amount),
            },
          ]}
        />
      </Disclosure>
    </Sheet>
  )
}
