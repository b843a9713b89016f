import type { Metadata } from 'next'
import { z } from 'zod'
import { ButtonRow, LinkButton } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'
import { ORDER_MOVES } from '@/lib/core/states/order'
import { statesOf } from '@/lib/core/states/next'
import { moneyWords } from '@/lib/messages/money-desk'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { listRunOrders } from '@/lib/queries/runs/list-run-orders'
import { runOfPage } from '../_parts/run-of-page'
import { RunTabs } from '../_parts/run-tabs'
import { OrderTable } from './_parts/order-table'

export const metadata: Metadata = { title: words.ordersTitle }

const STATES = statesOf(ORDER_MOVES)
const Query = z.object({
  state: z.enum(STATES).optional().catch(undefined),
  before: z.coerce.number().int().positive().max(2_147_483_647).optional().catch(undefined),
})

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<Record<string, string>>
}

export default async function RunOrdersPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunPage(workshop, run, 'orders')
  const { actor, page } = await runOfPage({ params, deed: 'order:list', here })
  const query = Query.parse(await searchParams)
  const list = await listRunOrders({ actor, workshopId: page.workshop.id, runId: run, ...query })
  return (
    <>
      <PageHead
        title={words.runTitle(page.module.name, page.number)}
        trail={[{ href: paths.adminRuns(workshop), label: words.title }]}
      />
      <RunTabs workshop={workshop} run={run} current="orders" />
      {page.state === 'taking_deposits' || page.state === 'locked' ? (
        <ButtonRow>
          <LinkButton href={paths.adminOrderNew(workshop, run)}>{moneyWords.enter}</LinkButton>
        </ButtonRow>
      ) : null}
      <OrderTable page={page} list={list} here={here} {...query} />
    </>
  )
}
