import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { InterestSheets } from '@/components/demand/interest-sheets'
import { demandWords as words } from '@/lib/messages/demand'
import { paths } from '@/lib/paths'
import { getInterestBoard } from '@/lib/queries/demand/get-interest-board'
import { loadModule, type ModulePageProps } from '../_parts/load-module'
import { ModuleHead } from '../_parts/module-head'

export const metadata: Metadata = { title: words.interest }

export default async function ModuleInterestPage({ params }: ModulePageProps) {
  const { actor, workshop, desk } = await loadModule(params)
  const { slug: module } = desk.module
  const board = await getInterestBoard({ actor, workshopId: workshop.id, module })
  if (!board) notFound()
  const { workshop: slug } = await params
  return (
    <>
      <ModuleHead slug={slug} module={desk.module} page="interest" lead={words.interestLead} />
      <InterestSheets board={board} csvHref={paths.api.adminModuleInterest(slug, module)} />
    </>
  )
}
