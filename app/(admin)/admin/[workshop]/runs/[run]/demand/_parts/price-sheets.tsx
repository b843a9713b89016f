import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { DemandBoard } from '@/lib/contracts/demand'
import { demandWords as words } from '@/lib/messages/demand'
import { writtenNumber } from '@/lib/messages/written'

/** Demand and expected profit along the prices people stated, one sheet per offer. */
export function PriceSheets({ board }: { board: DemandBoard }) {
  const sum = (minor: number) => <Money minor={minor} currency={board.currency} locale={board.locale} />
  return board.prices.map(({ offer, best, points }) => {
    const title = words.prices(words.offers[offer] ?? offer)
    return (
      <Sheet key={offer} title={title}>
        <p className="max-w-words pb-3 text-15 text-quiet">{words.pricesLead}</p>
        <Table
          caption={title}
          captionHidden
          narrow="scroll"
          rows={points}
          rowKey={({ priceMinor }) => String(priceMinor)}
          empty={words.none}
          columns={[
            {
              key: 'price',
              heading: words.price,
              cell: ({ priceMinor }) => (
                <>
                  {sum(priceMinor)} {priceMinor === best ? <strong>{words.best}</strong> : null}
                </>
              ),
            },
            {
              key: 'members',
              heading: words.members,
              kind: 'figures',
              cell: ({ members }) => writtenNumber(members),
            },
            {
              key: 'expected',
              heading: words.expected,
              kind: 'figures',
              cell: ({ expectedUnits }) => words.tenth(expectedUnits),
            },
            {
              key: 'chance',
              heading: words.chance,
              kind: 'figures',
              cell: ({ chanceToGo }) => <Percent ratio={chanceToGo} />,
            },
            {
              key: 'profit',
              heading: words.profit,
              kind: 'figures',
              cell: ({ expectedProfitMinor: profit }) => (profit === null ? words.notKnown : sum(profit)),
            },
          ]}
        />
      </Sheet>
    )
  })
}
