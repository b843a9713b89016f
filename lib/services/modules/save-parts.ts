import 'server-only'
import type { Transaction } from 'sequelize'
import type { PartsInput } from '@/lib/contracts/module-forms'
import type { PartRow } from '@/lib/contracts/parts-list'
import { refuseFields } from '@/lib/contracts/problem'
import { minor } from '@/lib/core/brand'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Part, Quote, QuoteBreak, RevisionLine } from '@/models'
import { lockModule, lockRevision } from '../_steps/find-module'
import { readPartsCsv } from '../_steps/read-parts-csv'
import { refreshPlanParts } from '../_steps/refresh-plan-parts'

/**
 * Replaces a revision's parts list by the lines of a pasted one. Parts are the workshop's and found by their code: what
 * the list says of them is taken over. A quote of the same supplier, currency and day is corrected, any other one added.
 * Refuses: not_found · forbidden · invalid (unknown revision; a line that cannot be read). Locks: the module, the
 * revision. Writes: lines, parts, quotes, the base plan's parts. Repeat: safe.
 */
export function saveParts(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: PartsInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'part:write', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const revision = await lockRevision(tx, module.id, input.revision)
    if (!revision) return refuseFields({ revision: moduleMistakes.revisionUnknown })
    const read = readPartsCsv(input.csv)
    if (!read.ok) return refuseFields({ csv: read.reason })

    await RevisionLine.destroy({ where: { revisionId: revision.id }, transaction: tx })
    for (const [position, row] of read.value.entries()) {
      const part = await savePart(tx, workshopId, row, now)
      const { designators, perUnit, placedBy, attritionBasisPoints, attritionAtLeast, supplyPins } = row
      await RevisionLine.create(
        {
          workshopId,
          revisionId: revision.id,
          partId: part.id,
          position,
          designators,
          perUnit,
          placedBy,
          choiceAnswerId: null,
          attritionBasisPoints,
          attritionAtLeast,
          supplyPins,
        },
        { transaction: tx },
      )
      if (row.quote) await saveQuote(tx, part, row.quote)
    }
    await refreshPlanParts(tx, { moduleId: module.id, byPersonId: actor.personId, now })
    return ok({ module: module.slug, revision: revision.letter, lines: read.value.length })
  })
}

async function savePart(tx: Transaction, workshopId: string, row: PartRow, now: Date): Promise<Part> {
  const { code, description, value, lifecycle, needsSample, polarityNote } = row
  const said = { description, value, lifecycle, needsSample, polarityNote }
  const [part, isNew] = await Part.findOrCreate({
    where: { workshopId, code },
    defaults: {
      workshopId,
      code,
      ...said,
      sampleCheckedOn: null,
      sampleFits: null,
      sampleNote: null,
      sampleByPersonId: null,
      createdAt: now,
    },
    transaction: tx,
  })
  return isNew ? part : part.update(said, { transaction: tx })
}

async function saveQuote(tx: Transaction, part: Part, quote: NonNullable<PartRow['quote']>): Promise<void> {
  const { breaks, supplier, currency, quotedOn, setupMinor, ...rest } = quote
  const { workshopId } = part
  const conditions = { ...rest, setupMinor: minor(setupMinor) }
  const [row, isNew] = await Quote.findOrCreate({
    where: { partId: part.id, supplier, currency, quotedOn },
    defaults: { workshopId, partId: part.id, supplier, currency, quotedOn, ...conditions },
    transaction: tx,
  })
  if (!isNew) {
    await row.update(conditions, { transaction: tx })
    await QuoteBreak.destroy({ where: { quoteId: row.id }, transaction: tx })
  }
  await QuoteBreak.bulkCreate(
    breaks.map(({ from, unitPrice }) => ({ workshopId, quoteId: row.id, fromQuantity: from, unitPrice })),
    { transaction: tx },
  )
}
