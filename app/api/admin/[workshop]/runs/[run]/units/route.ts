import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { RecordUnitsInput } from '@/lib/contracts/units'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { unitWords as words } from '@/lib/messages/units'
import { paths } from '@/lib/paths'
import { listRunUnits } from '@/lib/queries/units/list-run-units'
import { recordUnits } from '@/lib/services/units/record-units'

const params = z.object({ workshop: slug, run: uuid })

export const GET = route({ deed: 'unit:read', params }, async ({ actor, workshop, params }) => {
  const units = await listRunUnits({ actor, workshopId: workshop.id, runId: params.run })
  const rows = units.map(({ serial, offer, state, orderNumber }) => [serial, offer, state, orderNumber ?? ''])
  return csv([words.serial, words.offer, words.state, words.order], rows, 'units.csv')
})

export const POST = route(
  {
    deed: 'unit:import',
    params,
    body: RecordUnitsInput,
    form: {
      name: 'units',
      back: ({ params, draft }) => `${paths.adminRunUnits(params.workshop, params.run)}?draft=${draft}`,
      done: ({ params }) => `${paths.adminRunUnits(params.workshop, params.run)}?saved=units`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    recordUnits({ actor, workshopId: workshop.id, runId: params.run, input: body, now }),
)
