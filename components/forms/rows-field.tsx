import { CheckField } from '@/components/ui/choice-field'
import { FieldNotes } from '@/components/ui/field-frame'
import { fieldId, typedText, type FormState } from '@/components/ui/form-state'
import { SelectField } from '@/components/ui/select-field'
import { DateField, NumberField, TextField } from '@/components/ui/text-field'

export type RowColumn = {
  name: string
  label: string
  kind?: 'text' | 'number' | 'decimal' | 'select' | 'tick' | 'date'
  options?: readonly { value: string; label: string }[]
  unit?: string
  /** What an empty row starts with; the contract must know that it alone makes no row. */
  preset?: string
  width?: 'short' | 'medium' | 'full'
}

type Props = {
  /** The list in the body: fields are `name.0.column`. */
  name: string
  legend: React.ReactNode
  hint?: React.ReactNode
  columns: readonly RowColumn[]
  /** What one row is called: "Row 2". */
  rowLabel: (number: number) => string
  form?: FormState
  /** Empty rows after those filled in, and how many there can be at all. */
  spare?: number
  most: number
}

/** Rows of the same fields, with empty ones at the end: a list that can be filled in without script. */
export function RowsField({ name, legend, hint, columns, rowLabel, form, spare = 2, most }: Props) {
  const count = Math.min(most, filledRows(form, name) + spare)
  const id = fieldId(name)
  return (
    <fieldset className="min-w-0" id={id} aria-describedby={hint ? `${id}-hint` : undefined}>
      <legend className="text-17 font-semibold">{legend}</legend>
      <FieldNotes id={id} hint={hint} sentence={form?.errors?.[name]} className="pb-2" />
      <div className="flex flex-col">
        {Array.from({ length: count }, (_, row) => (
          <fieldset key={row} className="min-w-0 border-t border-rule py-3">
            <legend className="float-left w-full pb-1 text-13 text-quiet">{rowLabel(row + 1)}</legend>
            <div className="clear-both grid grid-cols-2 items-end gap-3 md:grid-cols-4 lg:grid-cols-5">
              {columns.map((column) => (
                <RowCell
                  key={column.name}
                  column={column}
                  name={`${name}.${row}.${column.name}`}
                  form={form}
                />
              ))}
            </div>
          </fieldset>
        ))}
      </div>
    </fieldset>
  )
}

function RowCell({ column, name, form }: { column: RowColumn; name: string; form?: FormState }) {
  const { label, unit, width = 'full' } = column
  const typed = typedText(form, name) ?? column.preset
  const given = { name, label, form, width, required: false }
  switch (column.kind) {
    case 'select':
      return <SelectField {...given} options={column.options ?? []} defaultValue={typed ?? ''} />
    case 'tick':
      return <CheckField name={name} label={label} form={form} optional />
    case 'date':
      return <DateField {...given} defaultValue={typed} />
    case 'number':
    case 'decimal':
      return <NumberField {...given} decimal={column.kind === 'decimal'} unit={unit} defaultValue={typed} />
    default:
      return <TextField {...given} unit={unit} defaultValue={typed} autoComplete="off" />
  }
}

/** How many rows hold something, counted to the last one that does. */
export function filledRows(form: FormState | undefined, name: string): number {
  const rows = Object.keys(form?.values ?? {}).flatMap((each) => {
    const row = each.startsWith(`${name}.`) ? Number(each.slice(name.length + 1).split('.')[0]) : NaN
    return Number.isInteger(row) ? [row] : []
  })
  return rows.length === 0 ? 0 : Math.max(...rows) + 1
}
