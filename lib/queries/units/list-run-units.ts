import 'server-only'
import { QueryTypes } from 'sequelize'
import type { UnitRow } from '@/lib/contracts/units'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

const MOST = 1000

/** Units of a run by serial number, with the order each is packed for; nothing for who may not read them. One statement. */
export async function listRunUnits(cmd: {
  actor: Actor
  workshopId: string
  runId: string
}): Promise<UnitRow[]> {
  const { actor, workshopId, runId } = cmd
  if (!can(actor, 'unit:read', { workshopId })) return []
  return sequelize.query<UnitRow>(
    `select u.id as unit, u.serial, u.offer_kind as offer, u.state, o.number::text as "orderNumber"
     from units u left join order_lines ol on ol.id = u.order_line_id left join orders o on o.id = ol.order_id
     where u.workshop_id = $workshopId and u.run_id = $runId order by u.serial limit $most`,
    { bind: { workshopId, runId, most: MOST }, type: QueryTypes.SELECT },
  )
}
