import { FieldFrame, controlClass } from './field-frame'
import { classNames } from './class-names'
import { describeField, typedText, type FieldProps } from './form-state'

type Input = Omit<React.ComponentProps<'input'>, 'form' | 'width' | 'name' | 'id'>
type Props = FieldProps & Input & { unit?: React.ReactNode }

/** One line of text; `type` for e-mail, telephone and the like. Other attributes go to the input. */
export function TextField(props: Props) {
  const {
    name,
    label,
    hint,
    form,
    error: _error,
    id: _id,
    optional,
    width,
    unit,
    className,
    ...input
  } = props
  const { id, sentence, aria } = describeField(props)
  const unitId = unit ? `${id}-unit` : ''
  const described = [aria['aria-describedby'], unitId].filter(Boolean).join(' ') || undefined
  return (
    <FieldFrame {...{ id, label, hint, sentence, optional, width }}>
      <span className="flex items-baseline">
        <input
          id={id}
          name={name}
          type="text"
          required={!optional}
          className={classNames(controlClass, className)}
          {...aria}
          {...input}
          defaultValue={input.value === undefined ? (typedText(form, name) ?? input.defaultValue) : undefined}
          aria-describedby={described}
        />
        {unit ? (
          <span id={unitId} className="figures unit pr-3 whitespace-nowrap">
            {unit}
          </span>
        ) : null}
      </span>
    </FieldFrame>
  )
}

/** A whole number or a decimal, typed as text so that nothing is rounded or scrolled away before it is read. */
export function NumberField({ decimal = false, ...props }: Props & { decimal?: boolean }) {
  return (
    <TextField
      inputMode={decimal ? 'decimal' : 'numeric'}
      autoComplete="off"
      width="short"
      {...props}
      className={classNames('figures text-right', props.className)}
    />
  )
}

/** A sum, typed as text with its currency beside it. */
export function MoneyField({ currency, ...props }: Props & { currency: string }) {
  return <NumberField decimal unit={currency} {...props} />
}

/** A calendar day. */
export function DateField(props: Props) {
  return <TextField type="date" width="short" {...props} className={classNames('figures', props.className)} />
}
