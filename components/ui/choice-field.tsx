import { ui } from '@/lib/messages/ui'
import { FieldNotes } from './field-frame'
import { classNames } from './class-names'
import { describeField, typedList, type FieldProps } from './form-state'

export type Choice = {
  value: string
  label: React.ReactNode
  hint?: React.ReactNode
  /** Stands at the right edge: a sum, a count. */
  aside?: React.ReactNode
  disabled?: boolean
}
type Input = Omit<React.ComponentProps<'input'>, 'form' | 'width' | 'name' | 'id' | 'type' | 'value'>
type Props = FieldProps &
  Input & { choices: readonly Choice[]; chosen?: string | readonly string[]; many?: boolean }

/** A group of which one is chosen, or with `many` any number. */
export function ChoiceField(props: Props) {
  const {
    name,
    label,
    hint,
    form,
    error: _error,
    id: _id,
    optional,
    width: _width,
    choices,
    chosen,
    many,
    className,
    ...input
  } = props
  const { id, sentence, aria } = describeField(props)
  const before = typedList(form, name) ?? (typeof chosen === 'string' ? [chosen] : chosen) ?? []
  return (
    <fieldset
      className={classNames('min-w-0 border px-3 pb-2', sentence ? 'border-rust' : 'border-quiet', className)}
      aria-describedby={aria['aria-describedby']}
    >
      <legend className="text-13 -ml-0.5 px-1.5 font-semibold">
        {label}
        {optional ? (
          <>
            {' '}
            <span className="text-quiet font-normal">({ui.optional})</span>
          </>
        ) : null}
      </legend>
      <FieldNotes id={id} hint={hint} sentence={sentence} className="pb-1" />
      {choices.map((choice, index) => (
        <label
          key={choice.value}
          className="border-rule bench:min-h-14 bench:py-4 flex min-h-11 items-start gap-3 border-t py-2.5 first-of-type:border-t-0"
        >
          <input
            {...input}
            id={index === 0 ? id : `${id}-${choice.value}`}
            type={many ? 'checkbox' : 'radio'}
            name={name}
            value={choice.value}
            required={!many && !optional}
            disabled={choice.disabled}
            defaultChecked={before.includes(choice.value)}
            aria-invalid={aria['aria-invalid']}
            className="accent-tide bench:size-6 mt-1 size-5 shrink-0"
          />
          <span className="min-w-0 flex-1">
            <span className="text-17 block">{choice.label}</span>
            {choice.hint ? <span className="text-13 text-quiet block">{choice.hint}</span> : null}
          </span>
          {choice.aside ? <span className="text-15 text-right">{choice.aside}</span> : null}
        </label>
      ))}
    </fieldset>
  )
}

type CheckProps = FieldProps & Input & { checked?: boolean }

/** One thing to tick. Sends "on" when ticked, nothing otherwise. */
export function CheckField(props: CheckProps) {
  const {
    name,
    label,
    hint,
    form,
    error: _error,
    id: _id,
    optional,
    width: _width,
    className,
    checked,
    ...input
  } = props
  const { id, sentence, aria } = describeField(props)
  return (
    <div className={classNames(sentence && 'border-rust border-l-2 pl-3', className)}>
      <label htmlFor={id} className="bench:min-h-14 flex min-h-11 items-start gap-3 py-2.5">
        <input
          id={id}
          name={name}
          type="checkbox"
          required={!optional}
          defaultChecked={
            form?.values ? form.values[name] !== undefined && form.values[name] !== false : checked
          }
          className="accent-tide bench:size-6 mt-1 size-5 shrink-0"
          {...aria}
          {...input}
        />
        <span className="max-w-words text-17">{label}</span>
      </label>
      <FieldNotes id={id} hint={hint} sentence={sentence} className="pb-2 pl-8" />
    </div>
  )
}
