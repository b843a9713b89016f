import 'server-only'
import { QueryTypes } from 'sequelize'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

/**
 * The parcel meant by an order's number as scanned or typed: the open one if there is one, else the packed one, else the
 * newest. Null when the workshop has none. One statement.
 */
export async function getParcelOfOrder(cmd: {
  actor: Actor
  workshopId: string
  number: string
}): Promise<string | null> {
  const { actor, workshopId } = cmd
  const number = cmd.number.trim()
  if (!can(actor, 'parcel:read', { workshopId }) || !/^\d{1,9}$/.test(number)) return null
  const [found] = await sequelize.query<{ id: string }>(
    `select p.id from parcels p join parcel_lines pl on pl.parcel_id = p.id join order_lines ol on ol.id = pl.order_line_id
     join orders o on o.id = ol.order_id
     where o.workshop_id = $workshopId and o.number = $number and p.state <> 'discarded'
     order by p.state = 'open' desc, p.state = 'packed' desc, p.number desc limit 1`,
    { bind: { workshopId, number: Number(number) }, type: QueryTypes.SELECT },
  )
  return found?.id ?? null
}
