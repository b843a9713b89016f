import 'server-only'
import { QueryTypes } from 'sequelize'
import type { HostWorkshop } from '@/lib/contracts/workshops'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'

/** Every workshop with its trader and totals, those waiting first; empty for anyone but the host. One query. */
export async function listWorkshops(cmd: { actor: Actor }): Promise<HostWorkshop[]> {
  if (!can(cmd.actor, 'host:read')) return []
  const rows = await sequelize.query<Omit<HostWorkshop, 'createdAt'> & { createdAt: Date }>(
    `select w.slug, w.name, w.state, w.legal_name as "legalName", w.country, w.currency, w.reply_to as "replyTo",
            w.charges_enabled_at is not null as "chargesEnabled", w.created_at as "createdAt",
            count(r.id)::int as runs, coalesce(sum(r.committed_units), 0)::int as units
     from workshops w left join runs r on r.workshop_id = w.id
     group by w.id order by w.state = 'pending' desc, w.created_at`,
    { type: QueryTypes.SELECT },
  )
  return rows.map((row) => ({ ...row, createdAt: row.createdAt.toISOString() }))
}
