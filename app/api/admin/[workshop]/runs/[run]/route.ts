import { RunParams, type RunView } from '@/lib/contracts/runs'
import { ok, refuse } from '@/lib/core/result'
import { route } from '@/lib/http/route'
import { readinessOfPage } from '@/lib/messages/readiness'
import { getRunPage } from '@/lib/queries/runs/get-run-page'
import { lookUpBalance } from '@/lib/services/balances/look-up-balance'

export const GET = route(
  { deed: 'run:read', params: RunParams },
  async ({ actor, workshop, params: { run: runId }, now }) => {
    const lying = await lookUpBalance({ actor, workshopId: workshop.id })
    const balanceMinor = lying.ok ? lying.value : null
    const page = await getRunPage({ actor, workshopId: workshop.id, runId, balanceMinor, now })
    if (!page) return refuse('not_found')
    const { id, module, revision, state, currency, minimum, maximum, decideBy } = page
    const { balanceWhen, opensToAllAt, offers, figures } = page
    return ok({
      ...{ id, module, revision, state, currency, minimum, maximum, decideBy },
      ...{ balanceWhen, opensToAllAt, offers, figures },
      readiness: readinessOfPage(page).map(({ key, state, words }) => ({ key, state, words })),
    } satisfies RunView)
  },
)
