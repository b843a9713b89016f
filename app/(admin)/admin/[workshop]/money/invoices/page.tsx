import type { Metadata } from 'next'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'
import { listInvoices } from '@/lib/queries/invoices/list-invoices'
import { InvoiceTable } from '../_parts/invoice-table'
import { MoneyHead } from '../_parts/money-head'

export const metadata: Metadata = { title: words.invoices }

type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<{ before?: string }> }

export default async function InvoicesPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const here = paths.adminMoney(slug, 'invoices')
  const { actor, workshop } = await deskOf(slug, 'money:read', here)
  const { before } = await searchParams
  const list = await listInvoices({ actor, workshopId: workshop.id, before })
  return (
    <>
      <MoneyHead slug={slug} current="invoices" lead={words.invoicesLead} />
      <InvoiceTable slug={slug} list={list} here={here} isFirst={before === undefined} />
    </>
  )
}
