import 'server-only'
import type { RevisionInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes } from '@/lib/messages/module-mistakes'
import { Revision } from '@/models'
import { lockModule } from '../_steps/find-module'
import { recordMove } from '../_steps/record-move'

/**
 * Begins a revision of a module's electronics; without a letter it takes the next one.
 * Refuses: not_found · forbidden · invalid (letter taken). Locks: the module. Writes: revision, audit.
 * Repeat: makes another one, but a letter is taken once.
 */
export function createRevision(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: RevisionInput
  now: Date
}) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (actor.kind !== 'person' || !can(actor, 'revision:create', { workshopId })) return refuse('forbidden')
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const earlier = await Revision.findAll({
      where: { moduleId: module.id },
      attributes: ['letter'],
      transaction: tx,
    })
    const letters = earlier.map(({ letter }) => letter)
    const letter = input.letter ?? nextLetter(letters)
    if (letters.includes(letter)) return refuseFields({ letter: moduleMistakes.letterTaken })
    const revision = await Revision.create(
      {
        workshopId,
        moduleId: module.id,
        letter,
        note: input.note,
        boardWidthMm: input.boardWidthMm ?? null,
        boardHeightMm: input.boardHeightMm ?? null,
        createdAt: now,
        firstGoodAt: null,
        firstGoodByPersonId: null,
        firstGoodHow: null,
        firstGoodFileId: null,
      },
      { transaction: tx },
    )
    await recordMove(tx, {
      workshopId,
      subjectType: 'revision',
      subjectId: revision.id,
      from: null,
      event: 'create',
      to: 'draft',
      byPersonId: actor.personId,
      at: now,
    })
    return ok({ module: module.slug, revision: letter })
  })
}

/** A to Z, then AA to ZZ: the one after the last. */
function nextLetter(letters: readonly string[]): string {
  const number = (letter: string) => [...letter].reduce((sum, each) => sum * 26 + each.charCodeAt(0) - 64, 0)
  const next = Math.max(0, ...letters.map(number)) + 1
  const last = String.fromCharCode(65 + ((next - 1) % 26))
  return next <= 26 ? last : `${String.fromCharCode(64 + Math.floor((next - 1) / 26))}${last}`
}
