import 'server-only'
import { can, type Actor } from '@/lib/core/policy/can'
import { readKeptFile } from '@/lib/gateways/files/store'
import { StoredFile } from '@/models'

/** A kept file for who may see it: what is public for everybody, the rest for those who work in its workshop; null otherwise. */
export async function openFile(cmd: { actor: Actor; file: string }) {
  const row = await StoredFile.findOne({ where: { id: cmd.file, erasedAt: null } })
  if (!row) return null
  const isOpen = row.ownerScope === 'public'
  const isOurs =
    row.ownerScope === 'workshop' &&
    row.workshopId !== null &&
    can(cmd.actor, 'file:read', { workshopId: row.workshopId })
  if (!isOpen && !isOurs) return null
  const content = await readKeptFile(row.sha256)
  return content && { content, mediaType: row.mediaType, fileName: row.fileName, isPublic: isOpen }
}
