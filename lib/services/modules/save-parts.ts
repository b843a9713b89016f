import 'server-only'
import type { PartsInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { listAnswers } from '@/lib/queries/part-imports/list-answers'
import { lockModule, lockRevision } from '../_steps/find-module'
import { readPartsCsv } from '../_steps/read-parts-csv'
import { refreshPlanParts } from '../_steps/refresh-plan-parts'
import { writeParts } from '../_steps/write-parts'

/**
 * Replaces a revision's parts list by the lines of a pasted one. Parts are the workshop's and found by their code: what
 * the list says of them is taken over. A quote of the same supplier, currency and day is corrected, any other one added.
 * Refuses: not_found · forbidden · invalid (unknown revision; a line that cannot be read). Locks: the module, the
 * revision. Writes: lines, parts, quotes, alternates, the base plan's parts. Repeat: safe.
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
    const answers = await listAnswers(module.id, tx)
    const strange = read.value.find(({ choice }) => choice !== '' && !answers.has(choice.toLowerCase()))
    if (strange) return refuseFields({ csv: moduleMistakes.csv.choice(strange.code, strange.choice) })

    await writeParts(tx, { revision, rows: read.value, answers, now })
    await refreshPlanParts(tx, { moduleId: module.id, byPersonId: actor.personId, now })
    return ok({ module: module.slug, revision: revision.letter, lines: read.value.length })
  })
}
