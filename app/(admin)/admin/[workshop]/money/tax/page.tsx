import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { businessNow } from '@/lib/http/business-now'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'
import { getTaxReport } from '@/lib/queries/money/get-tax-report'
import { MoneyHead } from '../_parts/money-head'
import { TaxTable } from '../_parts/tax-table'

export const metadata: Metadata = { title: words.tax }

type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<{ year?: string }> }

export default async function TaxReportPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const here = paths.adminMoney(slug, 'tax')
  const { actor, workshop } = await deskOf(slug, 'tax:report', here)
  const { year } = await searchParams
  const asked = year && /^\d{4}$/.test(year) ? year : undefined
  const report = await getTaxReport({
    actor,
    workshopId: workshop.id,
    year: asked,
    now: await businessNow(),
  })
  if (!report) notFound()
  return (
    <>
      <MoneyHead slug={slug} current="tax" lead={words.taxLead(report.isTaxedOnArrival)} />
      <TaxTable report={report} here={here} csv={paths.api.adminTax(slug, report.year)} />
      <p className="max-w-words pt-4 text-15 text-quiet">{words.taxAdvice}</p>
    </>
  )
}
