import { demandCsv } from '@/app/(admin)/_parts/demand-csv'
import { RunParams } from '@/lib/contracts/runs'
import { refuse } from '@/lib/core/result'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { getDemandBoard } from '@/lib/queries/demand/get-demand-board'

export const GET = route(
  { deed: 'demand:export', params: RunParams },
  async ({ actor, workshop, params, now }) => {
    const board = await getDemandBoard({ actor, workshopId: workshop.id, runId: params.run, now })
    if (!board) return refuse('not_found')
    return csv(...demandCsv(board), `${board.module.slug}-demand.csv`)
  },
)
