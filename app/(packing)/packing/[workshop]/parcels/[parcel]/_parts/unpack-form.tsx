import { Button } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'

/** Takes packing back. */
export function UnpackForm({ slug, parcel }: { slug: string; parcel: string }) {
  return (
    <div className="flex flex-wrap items-center gap-3 print:hidden">
      <DeedForm action={paths.api.packingParcel(slug, parcel, 'reopen')}>
        <Button kind="secondary">{words.unpack}</Button>
      </DeedForm>
      <p className="text-15 text-quiet">{words.unpackHint}</p>
    </div>
  )
}
