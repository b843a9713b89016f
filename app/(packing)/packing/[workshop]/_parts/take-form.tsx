import { Button } from '@/components/ui/button'
import { SelectField } from '@/components/ui/select-field'
import { Sheet } from '@/components/ui/sheet'
import { NumberField } from '@/components/ui/text-field'
import type { QueueQuery } from '@/lib/contracts/packing'
import type { Actor } from '@/lib/core/policy/can'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { takenFields } from './taken-fields'

type Props = {
  slug: string
  query: QueueQuery
  packers: { person: string; name: string }[]
  actor: Actor
}

const USUAL = '20'

/** Takes the oldest promises of what the filter shows, for oneself or for somebody who packs here. */
export function TakeForm({ slug, query, packers, actor }: Props) {
  const me = actor.kind === 'person' ? actor.personId : ''
  const others = packers.filter(({ person }) => person !== me)
  return (
    <Sheet title={words.take.title} id="take">
      <p className="max-w-words pb-3 text-15 text-quiet">{words.take.hint}</p>
      <form
        action={paths.api.packingBatches(slug)}
        method="post"
        noValidate
        className="flex flex-wrap items-end gap-3"
      >
        {Object.entries(takenFields(query)).map(([name, value]) => (
          <input key={name} type="hidden" name={name} value={value} />
        ))}
        <NumberField name="most" label={words.take.most} defaultValue={USUAL} />
        {others.length > 0 ? (
          <SelectField
            name="packer"
            label={words.take.packer}
            options={others.map(({ person, name }) => ({ value: person, label: name }))}
            empty={words.take.me}
            required={false}
            width="short"
          />
        ) : null}
        <Button>{words.take.button}</Button>
      </form>
    </Sheet>
  )
}
