import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PackGroup, PackLine, QueueQuery } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import {
  GROUP,
  LINES,
  PROMISE,
  QUEUE_FROM,
  QUEUE_HAVING,
  QUEUE_WHERE,
  queueBind,
} from '@/lib/queries/packing/in-queue'
import { writtenLine } from '@/lib/queries/packing/list-pack-queue'
import type { ChosenAnswer } from '@/models/json'

const MOST = 40

type Row = Omit<PackGroup, 'lines'> & { lines: (Omit<PackLine, 'choices'> & { choices: ChosenAnswer[] })[] }

/**
 * Parcels that are free to take, counted by their contents: the commonest first, at most forty kinds. One statement.
 */
export async function listPackGroups(cmd: {
  actor: Actor
  workshopId: string
  query?: QueueQuery
}): Promise<PackGroup[]> {
  const { actor, workshopId, query = {} } = cmd
  if (!can(actor, 'packing:read', { workshopId })) return []
  const rows = await sequelize.query<Row>(
    `select "group", count(*)::int as count, (array_agg(lines order by promise, number))[1] as lines from (
       select ${GROUP} as "group", ${LINES} as lines, ${PROMISE} as promise, o.number
       from ${QUEUE_FROM} and ${QUEUE_WHERE} and b.id is null group by p.id, o.id having ${QUEUE_HAVING}) q
     group by "group" order by count desc, min(promise), "group" limit $most`,
    { bind: { workshopId, ...queueBind(query), most: MOST }, type: QueryTypes.SELECT },
  )
  return rows.map(({ lines, ...row }) => ({ ...row, lines: lines.map(writtenLine) }))
}
