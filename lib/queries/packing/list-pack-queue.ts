import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PackLine, QueueItem, QueueQuery } from '@/lib/contracts/packing'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { ADDRESSEE, PROMISE, QUEUE_FROM } from '@/lib/queries/packing/in-queue'
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
 * What can be packed now, oldest promise first: paid, not disputed, not on hold, its destination not paused. `next` goes on
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
            json_agg(json_build_object('line', ol.id, 'module', m.name, 'offer', ol.offer_kind,
                                       'quantity', pl.quantity, 'choices', ol.choices) order by ol.position) as lines
     from ${QUEUE_FROM} and ($country::text is null or a.country = $country)
     group by p.id, o.id, a.id, r.id
     having ($offer::text is null or bool_or(ol.offer_kind = $offer))
       and ($day::date is null or (${PROMISE}, o.number, p.id) > ($day::date, $number::int, $parcel::uuid))
     order by ${PROMISE}, o.number, p.id limit $limit`,
    {
      bind: {
        workshopId,
        country: query.country ?? null,
        offer: query.offer ?? null,
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
    lines: lines.map(({ choices, ...line }) => ({ ...line, choices: choices.map(writtenChoice) })),
  }
}

/** An answer as papers and screens name it. */
export const writtenChoice = ({ question, label }: ChosenAnswer) => `${question}: ${label}`
