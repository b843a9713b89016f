import 'server-only'
import type { Transaction } from 'sequelize'
import { MOST_FILES, MOST_PIXELS, type FileInput } from '@/lib/contracts/files'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { readMedia, type Media } from '@/lib/gateways/files/read-media'
import { keepFile } from '@/lib/gateways/files/store'
import { fileWords } from '@/lib/messages/files'
import { Lesson, type Module, Offer, Revision, StoredFile } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'

type Sent = { name: string; content: Buffer }

/**
 * Keeps a picture, a sound or a document of a module, a revision, an offer or a lesson. A picture is drawn anew first, so
 * that nothing hidden in it stays. What belongs to a module or offer is public; the rest is the workshop's.
 * Refuses: forbidden · not_found · invalid (no file, none we take, too large, too many, not this module's). Locks: the
 * module. Writes: the file; the module's page is made anew. Repeat: the file stands there twice, its bytes are kept once.
 */
export async function addFile(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: FileInput
  file: Sent | null
  now: Date
}) {
  const { actor, workshopId, input, file, now } = cmd
  if (actor.kind !== 'person' || !can(actor, 'file:add', { workshopId })) return refuse('forbidden')
  if (!file) return refuseFields({ file: fileWords.mistakes.empty_file })
  // Outside the transaction: drawing a picture anew takes longer than a row may be held.
  const media = await readMedia(file.content, MOST_PIXELS)
  if (!media.ok) return refuseFields({ file: fileWords.mistakes[media.reason] })
  const sha256 = await keepFile(media.value.content)
  return inTransaction(async (tx) => {
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!module) return refuse('not_found')
    const subject = await subjectOf(tx, module, input)
    if (!subject.ok) return subject
    const at = { workshopId, subjectType: input.subject, subjectId: subject.value, erasedAt: null }
    const { kind } = media.value
    const there = await StoredFile.count({ where: { ...at, kind }, transaction: tx })
    if (there >= MOST_FILES[kind])
      return refuseFields({ file: fileWords.mistakes.tooMany(kind, MOST_FILES[kind]) })
    const row = await StoredFile.create(
      {
        ...rowOf(media.value, file, input),
        ...{ ...at, personId: null, sha256, position: there, durationMs: null },
        ...{ createdAt: now, createdByPersonId: actor.personId },
      },
      { transaction: tx },
    )
    await modulePageChanged(tx, module.id)
    return ok({ file: row.id, kind })
  })
}

function rowOf(media: Media, file: Sent, { subject, alt, role }: FileInput) {
  const isPublic = subject === 'module' || subject === 'offer'
  return {
    kind: media.kind,
    ownerScope: isPublic ? ('public' as const) : ('workshop' as const),
    role: media.kind === 'document' ? role : '',
    mediaType: media.mediaType,
    byteCount: media.content.length,
    fileName: file.name.replaceAll(/[^\p{L}\p{N}._ -]+/gu, '_').slice(-200) || media.kind,
    alt,
    widthPx: media.widthPx,
    heightPx: media.heightPx,
  }
}

async function subjectOf(
  tx: Transaction,
  module: Module,
  { subject, revision, offer, lesson }: FileInput,
): Promise<Result<string, never> | FieldRefusal> {
  if (subject === 'module') return ok(module.id)
  const moduleId = module.id
  const found =
    subject === 'revision'
      ? await Revision.findOne({ where: { moduleId, letter: revision ?? '' }, transaction: tx })
      : subject === 'offer'
        ? await Offer.findOne({ where: { moduleId, kind: offer ?? 'kit' }, transaction: tx })
        : lesson && (await Lesson.findOne({ where: { moduleId, id: lesson }, transaction: tx }))
  return found ? ok(found.id) : refuseFields({ [subject]: fileWords.mistakes.noSubject })
}
