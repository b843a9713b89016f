import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Table } from '@/components/ui/table'
import type { WhatIfDesk, WhatIfFigures } from '@/lib/contracts/what-ifs'
import { offerWords } from '@/lib/messages/public'
import { whatIfWords as words } from '@/lib/messages/what-ifs'
import { writtenNumber } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

type Row = { key: string; name: string; cell: (plan: WhatIfFigures) => React.ReactNode }

/** The run as planned and its what-ifs, figure by figure. */
export function WhatIfTable({ slug, desk }: { slug: string; desk: WhatIfDesk }) {
  const { plans, run, locale, offers } = desk
  const sum = (minor: number) => <Money minor={minor} currency={run.currency} locale={locale} />
  const rows: Row[] = [
    { key: 'units', name: words.units, cell: ({ units }) => writtenNumber(units) },
    ...offers.map(({ offer }): Row => ({
      key: offer,
      name: words.price(offerWords[offer]),
      cell: ({ prices }) => sum(prices.find((price) => price.offer === offer)?.priceMinor ?? 0),
    })),
    {
      key: 'yield',
      name: words.yield,
      cell: ({ yieldBasisPoints }) => <Percent basisPoints={yieldBasisPoints} digits={1} />,
    },
    { key: 'cost', name: words.costPerUnit, cell: ({ costPerUnit }) => sum(costPerUnit) },
    { key: 'left', name: words.profitPerUnit, cell: ({ profitPerUnit }) => sum(profitPerUnit) },
    { key: 'profit', name: words.profit, cell: ({ profit }) => sum(profit) },
    {
      key: 'even',
      name: words.breakEven,
      cell: ({ breakEven }) => (breakEven === null ? words.never : writtenNumber(breakEven)),
    },
    { key: 'expected', name: words.expected, cell: ({ expectedProfit }) => sum(expectedProfit) },
    { key: 'loss', name: words.chanceOfLoss, cell: ({ chanceOfLoss }) => <Percent ratio={chanceOfLoss} /> },
    { key: 'starts', name: words.starts, cell: ({ starts }) => writtenNumber(starts) },
    { key: 'cash', name: words.cashLow, cell: ({ cashLow }) => sum(cashLow) },
    {
      key: 'unpriced',
      name: words.unpriced,
      cell: ({ unpriced }) => (unpriced === 0 ? words.nothing : words.lines(unpriced)),
    },
    {
      key: 'remove',
      name: words.away,
      cell: ({ id, name }) =>
        id === null ? (
          words.stays
        ) : (
          <DeedForm action={paths.api.adminRunDeed(slug, run.id, 'what-ifs/remove')} hidden={{ plan: id }}>
            <Button kind="plain" aria-label={words.removeNamed(name)}>
              {words.remove}
            </Button>
          </DeedForm>
        ),
    },
  ]
  return (
    <Table
      caption={words.caption}
      rows={rows}
      rowKey={({ key }) => key}
      empty={words.noPlan}
      narrow="scroll"
      columns={[
        { key: 'figure', heading: words.figure, cell: ({ name }) => name },
        ...plans.map((plan) => ({
          key: plan.id ?? 'own',
          heading: plan.id === null ? words.asPlanned : plan.name,
          kind: 'figures' as const,
          cell: (row: Row) => row.cell(plan),
        })),
      ]}
    />
  )
}
