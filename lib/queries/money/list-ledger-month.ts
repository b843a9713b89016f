import 'server-only'
import { QueryTypes } from 'sequelize'
import type { LedgerExportLine } from '@/lib/contracts/money-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { startOfDay } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { Workshop } from '@/models'

/** Every entry of a month in the workshop's zone, in the order booked; null for who may not see it. Two statements. */
export async function listLedgerMonth(asked: {
  actor: Actor
  workshopId: string
  /** 'YYYY-MM'. */
  month: string
}): Promise<LedgerExportLine[] | null> {
  const { actor, workshopId, month } = asked
  if (!can(actor, 'ledger:export', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId, { attributes: ['timeZone'], rejectOnEmpty: true })
  const [year, number] = month.split('-').map(Number) as [number, number]
  const after = number === 12 ? `${year + 1}-01` : `${year}-${String(number + 1).padStart(2, '0')}`
  const rows = await sequelize.query<Omit<LedgerExportLine, 'at'> & { at: Date }>(
    `select t.at, t.id as transfer, t.kind, o.number as "orderNumber", e.account, e.amount_minor as "amountMinor",
            e.currency
     from ledger_transfers t join ledger_entries e on e.transfer_id = t.id left join orders o on o.id = t.order_id
     where t.workshop_id = $workshopId and t.at >= $from and t.at < $to order by t.at, t.id, e.position`,
    {
      bind: {
        workshopId,
        from: startOfDay(`${month}-01`, workshop.timeZone).toISOString(),
        to: startOfDay(`${after}-01`, workshop.timeZone).toISOString(),
      },
      type: QueryTypes.SELECT,
    },
  )
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }))
}
