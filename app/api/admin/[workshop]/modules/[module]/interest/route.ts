import { z } from 'zod'
import { demandCsv } from '@/app/(admin)/_parts/demand-csv'
import { slug } from '@/lib/contracts/fields'
import { refuse } from '@/lib/core/result'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { getInterestBoard } from '@/lib/queries/demand/get-interest-board'

const params = z.object({ workshop: slug, module: slug })

export const GET = route({ deed: 'demand:export', params }, async ({ actor, workshop, params }) => {
  const board = await getInterestBoard({ actor, workshopId: workshop.id, module: params.module })
  if (!board) return refuse('not_found')
  return csv(...demandCsv(board), `${board.module.slug}-interest.csv`)
})
