import { Money } from '@/components/format/money'
import { When } from '@/components/format/when'
import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { StuckItem } from '@/lib/contracts/money-desk'
import { moneyWords as words, stuckWords } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'

type Props = { slug: string; stuck: StuckItem[]; zone: string }

/** Everything that should have settled by now, each with the one button that cannot do harm. */
export function StuckSheet({ slug, stuck, zone }: Props) {
  return (
    <Sheet title={words.stuck} id="stuck">
      {stuck.length === 0 ? (
        <p>{words.nothingStuck}</p>
      ) : (
        <Table
          caption={words.stuck}
          captionHidden
          rows={stuck}
          rowKey={(row) => `${row.kind} ${row.id}`}
          empty={words.nothingStuck}
          columns={[
            { key: 'what', heading: words.what, cell: (row) => stuckWords(row) },
            {
              key: 'order',
              heading: words.order,
              cell: (row) =>
                row.order === null ? (
                  '–'
                ) : (
                  <a href={paths.adminOrder(slug, row.order)} className="figures inline-flex min-h-6">
                    {row.orderNumber}
                  </a>
                ),
            },
            {
              key: 'sum',
              heading: words.sum,
              kind: 'figures',
              cell: (row) =>
                row.amountMinor === null || row.currency === null ? (
                  '–'
                ) : (
                  <Money minor={row.amountMinor} currency={row.currency} />
                ),
            },
            { key: 'since', heading: words.since, cell: (row) => <When at={row.since} zone={zone} /> },
          ]}
          actions={(row) => (
            <DeedForm
              action={paths.api.adminMoneyDeed(slug, 'resolve')}
              hidden={{ kind: row.kind, id: row.id }}
            >
              <Button kind="secondary">{words.resolve[row.kind]}</Button>
            </DeedForm>
          )}
        />
      )}
      <p className="max-w-words pt-3 text-15 text-quiet">{words.stuckNote}</p>
    </Sheet>
  )
}
