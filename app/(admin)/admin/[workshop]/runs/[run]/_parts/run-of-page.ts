import { notFound, redirect } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import type { RunPage } from '@/lib/contracts/run-page'
import { uuid } from '@/lib/contracts/fields'
import type { Actor } from '@/lib/core/policy/can'
import type { Deed } from '@/lib/core/policy/deeds'
import { needsSecondFactor, secondFactorFresh } from '@/lib/core/policy/second-factor'
import { businessNow } from '@/lib/http/business-now'
import { paths } from '@/lib/paths'
import { getRunPage } from '@/lib/queries/runs/get-run-page'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { lookUpBalance } from '@/lib/services/balances/look-up-balance'

type Asked = { params: Promise<{ workshop: string; run: string }>; deed: Deed; here: string }

/**
 * The run a page is about, for who may do `deed` with it; otherwise the page does not exist. A deed that wants a fresh code
 * asks for it before anything is typed, so that nothing typed is lost.
 */
export async function runOfPage({ params, deed, here }: Asked): Promise<{ actor: Actor; page: RunPage }> {
  const { workshop: slug, run } = await params
  const actor = await signedIn(here)
  const workshop = await getDeskWorkshop({ actor, slug, deed })
  if (!workshop || !uuid.safeParse(run).success) notFound()
  if (needsSecondFactor(deed) && !secondFactorFresh(actor, new Date())) redirect(paths.secondFactor(here))
  const lying = await lookUpBalance({ actor, workshopId: workshop.id })
  const page = await getRunPage({
    actor,
    workshopId: workshop.id,
    runId: run,
    balanceMinor: lying.ok ? lying.value : null,
    now: await businessNow(),
  })
  if (!page) notFound()
  return { actor, page }
}
