import { Money } from '@/components/format/money'
import { When } from '@/components/format/when'
import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import { Sheet } from '@/components/ui/sheet'
import { Table } from '@/components/ui/table'
import type { MoneyDesk } from '@/lib/contracts/money-desk'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'

type Compared = NonNullable<MoneyDesk['compared']>
type Props = { slug: string; compared: MoneyDesk['compared']; zone: string }

/** What the last comparison with the payment provider's lists found: nothing, or each difference. */
export function CompareSheet({ slug, compared, zone }: Props) {
  return (
    <Sheet title={words.comparison} id="comparison">
      <div className="flex flex-col gap-5">
        {compared === null ? (
          <p>{words.neverCompared}</p>
        ) : compared.differences.length === 0 ? (
          <Notice kind="done" title={words.agree}>
            <p>
              {words.agreeWords(compared.items)} <When at={compared.at} zone={zone} />.
            </p>
          </Notice>
        ) : (
          <Differences compared={compared} slug={slug} zone={zone} />
        )}
        <DeedForm action={paths.api.adminMoneyDeed(slug, 'compare')}>
          <Button kind="secondary">{words.compareNow}</Button>
        </DeedForm>
      </div>
    </Sheet>
  )
}

function Differences({ compared, slug, zone }: { compared: Compared; slug: string; zone: string }) {
  const sum = (side: Compared['differences'][number]['ours']) =>
    side ? <Money minor={side.amount} currency={side.currency} /> : words.nothing
  return (
    <>
      <Notice kind="attention" title={words.differ(compared.differences.length)}>
        <p>
          {words.differWords(compared.items)} <When at={compared.at} zone={zone} />.
        </p>
      </Notice>
      <Table
        caption={words.differencesCaption}
        captionHidden
        rows={compared.differences}
        rowKey={(row) => `${row.kind} ${row.isFee} ${row.id}`}
        empty={words.agree}
        columns={[
          {
            key: 'what',
            heading: words.what,
            cell: (row) =>
              row.isFee ? words.feeDiffers(words.differences[row.kind]) : words.differences[row.kind],
          },
          {
            key: 'order',
            heading: words.order,
            cell: (row) =>
              row.order === null ? (
                <span className="figures break-all">{row.id}</span>
              ) : (
                <a href={paths.adminOrder(slug, row.order)} className="figures inline-flex min-h-6">
                  {row.orderNumber}
                </a>
              ),
          },
          { key: 'ours', heading: words.ours, kind: 'figures', cell: (row) => sum(row.ours) },
          { key: 'theirs', heading: words.theirs, kind: 'figures', cell: (row) => sum(row.theirs) },
        ]}
      />
    </>
  )
}
