import { RowsField, type RowColumn } from '@/components/forms/rows-field'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import { NumberField, TextField } from '@/components/ui/text-field'
import { planAdminWords as words } from '@/lib/messages/plan-admin'

type Props = { currency: string; form: FormState }

const kinds = Object.entries(words.kinds).map(([value, label]) => ({ value, label }))

/** Boards and front panels, assembly, what comes on top per supplier, exchange rates. */
export function PlanBuying({ currency, form }: Props) {
  const own: RowColumn = { name: 'currency', label: words.currency, preset: currency }
  const boards: RowColumn[] = [
    { name: 'name', label: words.name },
    { name: 'kind', label: words.kind, kind: 'select', options: kinds, preset: 'board' },
    { name: 'supplier', label: words.supplier },
    own,
    { name: 'breaks', label: words.breaks },
    { name: 'perUnit', label: words.perUnit, kind: 'number', preset: '1' },
    { name: 'perArray', label: words.perArray, kind: 'number', preset: '1' },
    { name: 'spare', label: words.spare, kind: 'number', preset: '0' },
    { name: 'moq', label: words.moq, kind: 'number', preset: '1' },
    { name: 'multiple', label: words.multiple, kind: 'number', preset: '1' },
    { name: 'setup', label: words.setup, kind: 'decimal' },
    { name: 'stencil', label: words.stencil, kind: 'decimal' },
    ...(['boards', 'kit', 'built'] as const).map((offer): RowColumn => ({
      name: offer,
      label: words.offer[offer],
      kind: 'tick',
    })),
  ]
  const assembly = (name: string) => ({ name: `assembly.${name}`, form, optional: true as const })
  return (
    <Sheet title={words.buying}>
      <div className="flex flex-col gap-5">
        <RowsField
          name="boards"
          legend={words.boards}
          hint={words.boardsHint}
          columns={boards}
          rowLabel={words.row}
          form={form}
          spare={1}
          most={8}
        />
        <Disclosure summary={words.boardWords}>
          <Facts facts={words.boardWordsList.map(([name, value]) => ({ name, value }))} />
        </Disclosure>
        <fieldset className="flex min-w-0 flex-col gap-3">
          <legend className="text-17 font-semibold">{words.assembly}</legend>
          <p className="text-13 text-quiet">{words.assemblyHint}</p>
          <div className="flex flex-wrap items-end gap-4">
            <TextField label={words.supplier} {...assembly('supplier')} />
            <TextField label={words.currency} width="short" {...assembly('currency')} />
            <NumberField label={words.setup} hint={words.hints.setup} decimal {...assembly('setup')} />
            <NumberField
              label={words.perDistinctPart}
              hint={words.hints.perDistinctPart}
              decimal
              {...assembly('perDistinctPart')}
            />
            <NumberField
              label={words.perStart}
              hint={words.hints.perStart}
              decimal
              {...assembly('perStart')}
            />
          </div>
        </fieldset>
        <RowsField
          name="suppliers"
          legend={words.suppliers}
          hint={words.suppliersHint}
          rowLabel={words.row}
          form={form}
          spare={1}
          most={12}
          columns={[
            { name: 'supplier', label: words.supplier },
            own,
            { name: 'freight', label: words.freight, kind: 'decimal' },
            { name: 'duty', label: words.duty, kind: 'decimal', unit: words.percent },
            { name: 'importTax', label: words.importTax, kind: 'decimal', unit: words.percent },
            { name: 'reclaimable', label: words.reclaimable, kind: 'tick' },
          ]}
        />
        <RowsField
          name="rates"
          legend={words.rates}
          hint={words.ratesHint}
          rowLabel={words.row}
          form={form}
          spare={1}
          most={8}
          columns={[
            { name: 'currency', label: words.currency },
            { name: 'rate', label: words.rate, kind: 'decimal' },
            { name: 'on', label: words.on, kind: 'date' },
            { name: 'margin', label: words.margin, kind: 'decimal', unit: words.percent },
          ]}
        />
      </div>
    </Sheet>
  )
}
