import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PackLine, QueueItem, QueueQuery } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import {
  ADDRESSEE,
  LINES,
  PROMISE,
  QUEUE_FROM,
  QUEUE_HAVING,
  QUEUE_WHERE,
  queueBind,
} from '@/lib/queries/packing/in-queue'
import type { ChosenAnswer } from '@/models/json'

const PER_PAGE = 50

type Row = Omit<QueueItem, 'number' | 'lines'> & {
  number: number
  run: string
  lines: (Omit<PackLine, 'choices'> & { choices: ChosenAnswer[] })[]
}

/** An item of the queue with the run it belongs to. */
export type QueuedParcel = QueueItem & { run: string }

/**
 * What can be packed now, oldest promise first: paid, not disputed, not on hold, its destination not paused, and not in
 * another packer's batch unless that batch is asked for. `next` goes on
 * after the last item; null on the last page. Nobody but who may read the queue gets anything. One statement.
 */
export async function listPackQueue(cmd: {
  actor: Actor
  workshopId: string
  query?: QueueQuery
  /** Items a page, 50 unless said. */
  limit?: number
}): Promise<{ items: QueuedParcel[]; next: string | null }> {
  const { actor, workshopId, query = {}, limit = PER_PAGE } = cmd
  if (!can(actor, 'packing:read', { workshopId })) return { items: [], next: null }
  const [day, number, parcel] = query.after?.split('_') ?? []
  const rows = await sequelize.query<Row>(
    `select p.id as parcel, o.id as "order", o.number, a.country, ${ADDRESSEE} as name, r.id as run, ${PROMISE}::text as "postedBy",
            ${LINES} as lines
     from ${QUEUE_FROM} and ${QUEUE_WHERE}
       and ($batch::uuid is not null or b.id is null or b.packer_person_id = $mine)
     group by p.id, o.id, a.id, r.id
     having ${QUEUE_HAVING}
       and ($day::date is null or (${PROMISE}, o.number, p.id) > ($day::date, $number::int, $parcel::uuid))
     order by ${PROMISE}, o.number, p.id limit $limit`,
    {
      bind: {
        workshopId,
        ...queueBind(query),
        mine: actor.kind === 'person' ? actor.personId : null,
        day: day ?? null,
        number: number ?? null,
        parcel: parcel ?? null,
        limit: limit + 1,
      },
      type: QueryTypes.SELECT,
    },
  )
  const items = rows.slice(0, limit).map(asItem)
  const last = items.at(-1)
  const next = rows.length > limit && last ? `${last.postedBy}_${last.number}_${last.parcel}` : null
  return { items, next }
}

function asItem({ number, lines, ...row }: Row): QueuedParcel {
  return {
    ...row,
    number: String(number),
    lines: lines.map(writtenLine),
  }
}

/** A line as the database gives it, its answers in words. */
export const writtenLine = ({
  choices,
  ...line
}: Omit<PackLine, 'choices'> & { choices: ChosenAnswer[] }): PackLine => ({
  ...line,
  choices: choices.map(writtenChoice),
})

/** An answer as papers and screens name it. */
export const writtenChoice = ({ question, label }: ChosenAnswer) => `${question}: ${label}`
