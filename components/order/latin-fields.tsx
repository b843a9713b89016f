import type { FormState } from '@/components/ui/form-state'
import { TextField } from '@/components/ui/text-field'
import { addressWords as words } from '@/lib/messages/orders'

/** The same address in Latin letters, for the post of the country it is sent from. */
export function LatinFields({ prefix, form }: { prefix: string; form?: FormState }) {
  const fields = [
    { name: 'latin.name', label: words.latinName },
    { name: 'latin.lines.0', label: words.latinLine },
    { name: 'latin.city', label: words.latinCity },
    { name: 'latin.region', label: words.latinRegion },
  ]
  return (
    <div className="flex flex-col gap-5 pt-2">
      <p className="text-quiet">{words.latinHint}</p>
      {fields.map(({ name, label }) => (
        <TextField key={name} name={`${prefix}${name}`} label={label} form={form} optional />
      ))}
    </div>
  )
}
