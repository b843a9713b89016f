import { FieldFrame, controlClass } from './field-frame'
import { classNames } from './class-names'
import { describeField, typedText, type FieldProps } from './form-state'

type Area = Omit<React.ComponentProps<'textarea'>, 'form' | 'name' | 'id'>

/** Several lines of text. */
export function TextArea(props: FieldProps & Area) {
  const {
    name,
    label,
    hint,
    form,
    error: _error,
    id: _id,
    optional,
    width = 'full',
    className,
    ...area
  } = props
  const { id, sentence, aria } = describeField(props)
  return (
    <FieldFrame {...{ id, label, hint, sentence, optional, width }}>
      <textarea
        id={id}
        name={name}
        rows={5}
        required={!optional}
        className={classNames(controlClass, 'max-w-words resize-y', className)}
        {...aria}
        {...area}
        defaultValue={area.value === undefined ? (typedText(form, name) ?? area.defaultValue) : undefined}
      />
    </FieldFrame>
  )
}
