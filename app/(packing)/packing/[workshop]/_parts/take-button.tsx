import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import type { PackGroup, QueueQuery } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { takenFields } from './taken-fields'

/** What one packer takes at once, of the same contents. */
const MOST = 200

/** Takes every order of the same contents as one batch. */
export function TakeButton({ slug, query, group }: { slug: string; query: QueueQuery; group: PackGroup }) {
  const count = Math.min(group.count, MOST)
  const hidden = { ...takenFields(query), group: group.group, most: String(count) }
  return (
    <DeedForm action={paths.api.packingBatches(slug)} hidden={hidden}>
      <Button kind="plain">{words.take.these(count)}</Button>
    </DeedForm>
  )
}
