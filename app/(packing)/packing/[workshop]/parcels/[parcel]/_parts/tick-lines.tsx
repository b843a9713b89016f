import { lineName } from '@/components/parcel/line-names'
import { FieldNotes } from '@/components/ui/field-frame'
import { fieldId, type FormState, typedText } from '@/components/ui/form-state'
import { TextField } from '@/components/ui/text-field'
import type { ParcelPage } from '@/lib/contracts/packing'
import { packingWords as words } from '@/lib/messages/packing'

type Props = { lines: ParcelPage['lines']; form?: FormState }

/** Each line with a box to tick, and a place for serial numbers where units of its form are recorded. */
export function TickLines({ lines, form }: Props) {
  const sentence = form?.errors?.lines
  const id = fieldId('lines')
  return (
    <fieldset id={id} tabIndex={-1} aria-describedby={sentence ? `${id}-error` : undefined}>
      <legend className="text-13 text-quiet">{words.linesHint}</legend>
      <FieldNotes id={id} sentence={sentence} />
      <ul>
        {lines.map((line, index) => (
          <li key={line.line} className="border-b border-rule py-2">
            <TickLine line={line} name={`lines.${index}`} form={form} />
          </li>
        ))}
      </ul>
    </fieldset>
  )
}

function TickLine({
  line,
  name,
  form,
}: {
  line: ParcelPage['lines'][number]
  name: string
  form?: FormState
}) {
  const id = fieldId(`${name}.line`)
  const sentence = form?.errors?.[`${name}.line`] ?? form?.errors?.[`${name}.quantity`]
  return (
    <>
      <input type="hidden" name={`${name}.quantity`} value={line.quantity} />
      <label htmlFor={id} className="flex min-h-11 items-center gap-3 bench:min-h-14">
        <input
          id={id}
          type="checkbox"
          name={`${name}.line`}
          value={line.line}
          defaultChecked={typedText(form, `${name}.line`) === line.line}
          aria-describedby={sentence ? `${id}-error` : undefined}
          aria-invalid={sentence ? true : undefined}
          className="size-5 shrink-0 accent-tide bench:size-6"
        />
        <span className="text-17 font-semibold">{lineName(line)}</span>
      </label>
      <FieldNotes id={id} sentence={sentence} />
      {line.hasUnits ? (
        <TextField
          name={`${name}.serials`}
          label={words.serials}
          hint={words.serialsHint}
          form={form}
          autoComplete="off"
          autoCapitalize="characters"
          className="figures"
          optional
        />
      ) : null}
    </>
  )
}
