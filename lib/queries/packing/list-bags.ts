import 'server-only'
import { QueryTypes } from 'sequelize'
import type { OfferKind } from '@/lib/contracts/fields'
import type { BagList } from '@/lib/contracts/papers'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { writtenChoice } from '@/lib/queries/packing/list-pack-queue'
import { Part, RevisionLine } from '@/models'
import type { ChosenAnswer } from '@/models/json'

type Counted = {
  module: string
  revision: string
  revisionId: string
  offer: OfferKind
  choices: ChosenAnswer[]
  bags: number
}

/**
 * What goes into the bags of the kits in parcels: per revision and choices the parts the buyer places, and how many such
 * bags. Kits without such parts are left out; nobody but who may print gets anything. Three statements.
 */
export async function listBags(cmd: {
  actor: Actor
  workshopId: string
  parcelIds: readonly string[]
  offerName: (kind: OfferKind) => string
}): Promise<BagList[]> {
  const { actor, workshopId, parcelIds, offerName } = cmd
  if (!can(actor, 'paper:print', { workshopId }) || parcelIds.length === 0) return []
  const counted = await sequelize.query<Counted>(
    `select m.name as module, rv.letter as revision, r.revision_id as "revisionId", ol.offer_kind as offer, ol.choices,
            sum(pl.quantity)::int as bags
     from parcel_lines pl join order_lines ol on ol.id = pl.order_line_id join orders o on o.id = ol.order_id
     join runs r on r.id = o.run_id join revisions rv on rv.id = r.revision_id join modules m on m.id = r.module_id
     where pl.workshop_id = $workshopId and pl.parcel_id = any ($ids::uuid[]) and ol.offer_kind <> 'built'
     group by m.name, rv.letter, r.revision_id, ol.offer_kind, ol.choices order by m.name, bags desc, ol.choices::text`,
    { bind: { workshopId, ids: parcelIds as string[] }, type: QueryTypes.SELECT },
  )
  const lines = await RevisionLine.findAll({
    where: { revisionId: [...new Set(counted.map(({ revisionId }) => revisionId))] },
    include: [{ model: Part, as: 'part', required: true }],
    order: [['position', 'ASC']],
  })
  return counted
    .map(({ module, revision, revisionId, offer, choices, bags }) => ({
      what: `${module}, revision ${revision}, ${offerName(offer)}`,
      choices: choices.map(writtenChoice),
      bags,
      parts: lines
        .filter((line) => line.revisionId === revisionId && isInBag(line, offer, choices))
        .map(({ perUnit, part, designators }) => ({
          quantity: perUnit,
          name: part!.description || part!.code,
          value: part!.value,
          place: part!.storagePlace,
          designators,
        })),
    }))
    .filter(({ parts }) => parts.length > 0)
}

/** What the buyer places comes in the bag; a part of one answer only where that was chosen. */
const isInBag = (line: RevisionLine, offer: OfferKind, choices: readonly ChosenAnswer[]) =>
  line.placedBy[offer] === 'buyer' &&
  (line.choiceAnswerId === null || choices.some(({ answerId }) => answerId === line.choiceAnswerId))
