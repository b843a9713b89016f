import 'server-only'
import { QueryTypes } from 'sequelize'
import type { FilesDesk, FileView } from '@/lib/contracts/files'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { Lesson, Module, Offer, Revision } from '@/models'

/** Everything kept of a module, its revisions, offers and lessons; null when there is nothing to see. Five queries. */
export async function getFilesDesk(cmd: {
  actor: Actor
  workshopId: string
  module: string
}): Promise<FilesDesk | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'file:read', { workshopId })) return null
  const module = await Module.findOne({ where: { workshopId, slug: cmd.module }, attributes: ['id'] })
  if (!module) return null
  const where = { moduleId: module.id }
  const revisions = await Revision.findAll({ where, order: [['letter', 'ASC']] })
  const offers = await Offer.findAll({ where, order: [['position', 'ASC']] })
  const lessons = await Lesson.findAll({ where, order: [['createdAt', 'DESC']] })
  const files = await sequelize.query<FileView>(FILES, {
    bind: { moduleId: module.id },
    type: QueryTypes.SELECT,
  })
  return {
    files,
    revisions: revisions.map(({ letter }) => letter),
    offers: offers.map(({ kind }) => kind),
    lessons: lessons.map(({ id, symptom }) => ({ id, symptom })),
  }
}

const FILES = `
  select f.id, f.kind, f.subject_type as subject, f.subject_id as "subjectId", f.role, f.alt,
         f.file_name as "fileName", f.byte_count as "byteCount", f.width_px as "widthPx",
         f.height_px as "heightPx", f.owner_scope = 'public' as "isPublic",
         coalesce(r.letter, o.kind, l.symptom, '') as of
  from files f
  left join revisions r on f.subject_type = 'revision' and r.id = f.subject_id
  left join offers o on f.subject_type = 'offer' and o.id = f.subject_id
  left join lessons l on f.subject_type = 'lesson' and l.id = f.subject_id
  where f.erased_at is null and f.kind in ('picture', 'sound', 'document')
    and ((f.subject_type = 'module' and f.subject_id = $moduleId) or r.module_id = $moduleId
         or o.module_id = $moduleId or l.module_id = $moduleId)
  order by f.subject_type, f.kind, f.position, f.created_at, f.id`
