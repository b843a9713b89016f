import { Money } from '@/components/format/money'
import { Notice } from '@/components/ui/notice'
import { Table } from '@/components/ui/table'
import type { PlanDesk } from '@/lib/contracts/module-desk'
import { planAdminWords as words } from '@/lib/messages/plan-admin'
import { offerWords } from '@/lib/messages/public'

/** Whether the plan is plausible: what a few sizes of run cost, and what is not in the sum. */
export function PlanTrial({ plan }: { plan: PlanDesk }) {
  if (!plan.isSaved) return <p className="max-w-words text-quiet">{words.fresh}</p>
  return (
    <>
      {plan.missing.length > 0 ? (
        <Notice kind="attention" title={words.missingTitle}>
          {words.missing(plan.missing.map((offer) => offerWords[offer]).join(', '))}
        </Notice>
      ) : null}
      <Table
        caption={words.trialTitle}
        rows={plan.trial}
        rowKey={(row) => String(row.units)}
        empty={words.fresh}
        columns={[
          { key: 'units', heading: words.units, kind: 'figures', cell: (row) => row.units },
          {
            key: 'cost',
            heading: words.cost,
            kind: 'figures',
            cell: (row) => <Money minor={row.costMinor} currency={plan.currency} />,
          },
          { key: 'unpriced', heading: words.unpriced, cell: (row) => row.unpriced.join(', ') },
        ]}
      />
      <p className="text-15 text-quiet">{words.partsIn(plan.parts)}</p>
    </>
  )
}
