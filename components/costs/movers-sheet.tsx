import { Money } from '@/components/format/money'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { costWords as words } from '@/lib/messages/costs'

/** The inputs that move the result most, each with the profit if it turns out less or more. */
export function MoversSheet({ figures: { movers, currency, locale } }: { figures: CostFigures }) {
  const sum = (minor: number) => <Money minor={minor} currency={currency} locale={locale} />
  return (
    <Sheet title={words.movers} id="movers">
      <p className="max-w-words pb-3 text-15 text-quiet">{words.moversLead}</p>
      <Table
        caption={words.moversCaption}
        captionHidden
        rows={movers}
        rowKey={({ key, name }) => `${key} ${name}`}
        empty={words.noMovers}
        narrow="scroll"
        columns={[
          { key: 'key', heading: words.mover, cell: ({ key, name }) => words.moverKinds[key](name) },
          { key: 'less', heading: words.less, kind: 'figures', cell: ({ less }) => sum(less) },
          { key: 'more', heading: words.more, kind: 'figures', cell: ({ more }) => sum(more) },
        ]}
      />
    </Sheet>
  )
}
