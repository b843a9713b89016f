import type { Metadata } from 'next'
import { StatementSheet } from '@/components/money/statement-sheet'
import { PageHead } from '@/components/ui/page-head'
import { Stack } from '@/components/ui/columns'
import { moneyWords } from '@/lib/messages/money-desk'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { listInvoices } from '@/lib/queries/invoices/list-invoices'
import { getStatement } from '@/lib/queries/money/get-statement'
import { InvoiceTable } from '../../../money/_parts/invoice-table'
import { runOfPage } from '../_parts/run-of-page'
import { RunTabs } from '../_parts/run-tabs'

export const metadata: Metadata = { title: moneyWords.title }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ before?: string }>
}

export default async function RunMoneyPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunPage(workshop, run, 'money')
  const { actor, page } = await runOfPage({ params, deed: 'money:read', here })
  const { before } = await searchParams
  const workshopId = page.workshop.id
  const statement = await getStatement({ actor, workshopId, runId: run })
  const list = await listInvoices({ actor, workshopId, runId: run, before })
  return (
    <>
      <PageHead
        title={words.runTitle(page.module.name, page.number)}
        trail={[{ href: paths.adminRuns(workshop), label: words.title }]}
      />
      <RunTabs workshop={workshop} run={run} current="money" />
      <Stack>
        {statement ? <StatementSheet statement={statement} zone={page.workshop.timeZone} /> : null}
        <InvoiceTable slug={workshop} list={list} here={here} isFirst={before === undefined} />
      </Stack>
    </>
  )
}
