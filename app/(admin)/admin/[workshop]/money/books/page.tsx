import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { OutcomeNotice } from '@/app/(admin)/_parts/outcome-notice'
import { Stack } from '@/components/ui/columns'
import { dayIn } from '@/lib/core/time/zone'
import { businessNow } from '@/lib/http/business-now'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'
import { getMoneyDesk } from '@/lib/queries/money/get-money-desk'
import { CompareSheet } from '../_parts/compare-sheet'
import { ExportSheet } from '../_parts/export-sheet'
import { MoneyHead } from '../_parts/money-head'
import { StuckSheet } from '../_parts/stuck-sheet'

export const metadata: Metadata = { title: words.books }

type Props = {
  params: Promise<{ workshop: string }>
  searchParams: Promise<{ draft?: string; saved?: string }>
}

export default async function BooksPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { actor, workshop } = await deskOf(slug, 'money:read', paths.adminMoney(slug, 'books'))
  const now = await businessNow()
  const desk = await getMoneyDesk({ actor, workshopId: workshop.id, now })
  if (!desk) notFound()
  const { draft, saved } = await searchParams
  return (
    <>
      <MoneyHead slug={slug} current="books" lead={words.booksLead} />
      <Stack>
        <OutcomeNotice draft={draft} form="money" saved={saved} />
        <CompareSheet slug={slug} compared={desk.compared} zone={workshop.timeZone} />
        <StuckSheet slug={slug} stuck={desk.stuck} zone={workshop.timeZone} />
        <ExportSheet slug={slug} month={dayIn(now, workshop.timeZone).slice(0, 7)} />
      </Stack>
    </>
  )
}
