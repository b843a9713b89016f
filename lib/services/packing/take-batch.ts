import 'server-only'
import { QueryTypes } from 'sequelize'
import type { TakeBatchInput } from '@/lib/contracts/packing'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { packingMistakes, packingWords } from '@/lib/messages/packing'
import { PROMISE, QUEUE_FROM, QUEUE_HAVING, QUEUE_WHERE, queueBind } from '@/lib/queries/packing/in-queue'
import { Membership, PackBatch, Parcel, Workshop } from '@/models'

/**
 * Takes the next parcels of the queue for one packer, oldest promise first, as the filter says: from then on nobody else
 * packs them. Whoever may assign takes them for another packer of the workshop.
 * Refuses: forbidden · nothing_to_pack · invalid, at `packer` (does not pack here).
 * Locks: the workshop for the number, the parcels; two packers at once never get the same one. Writes: the batch, parcels.
 * Repeat: takes the next ones.
 */
export function takeBatch(cmd: { actor: Actor; workshopId: string; input: TakeBatchInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'batch:take', { workshopId })) return refuse('forbidden')
    const packer = input.packer ?? actor.personId
    if (packer !== actor.personId) {
      if (!can(actor, 'batch:assign', { workshopId })) return refuse('forbidden')
      const packs = { workshopId, personId: packer, role: ['packer', 'owner'], endedAt: null }
      if ((await Membership.count({ where: packs, transaction: tx })) === 0)
        return refuseFields({ packer: packingMistakes.notAPacker })
    }
    // The workshop's row puts two takers in turn; what the first took is in a batch when the second looks.
    await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE, rejectOnEmpty: true })
    const free = await sequelize.query<{ id: string }>(
      `select p.id from ${QUEUE_FROM} and ${QUEUE_WHERE} and b.id is null
       group by p.id, o.number having ${QUEUE_HAVING} order by ${PROMISE}, o.number, p.id limit $most`,
      {
        bind: { workshopId, ...queueBind(input), most: input.most },
        type: QueryTypes.SELECT,
        transaction: tx,
      },
    )
    if (free.length === 0) return refuse('nothing_to_pack')
    const number = (await PackBatch.count({ where: { workshopId }, transaction: tx })) + 1
    const batch = await PackBatch.create(
      {
        workshopId,
        runId: null,
        name: packingWords.batch.name(number),
        packerPersonId: packer,
        createdAt: now,
        closedAt: null,
      },
      { transaction: tx },
    )
    const [taken] = await Parcel.update(
      { batchId: batch.id },
      { where: { workshopId, id: free.map(({ id }) => id), state: 'open' }, transaction: tx },
    )
    return ok({ batch: batch.id, taken })
  })
}
