import { FieldFrame, controlClass } from './field-frame'
import { classNames } from './class-names'
import { describeField, type FieldProps } from './form-state'

type Input = Omit<React.ComponentProps<'input'>, 'form' | 'width' | 'name' | 'id' | 'type'>

/** A file to be sent along; browsers never fill one in again, so a form that comes back asks for it anew. */
export function FileField(props: FieldProps & Input) {
  const {
    name,
    label,
    hint,
    form: _form,
    error: _error,
    id: _id,
    optional,
    width,
    className,
    ...input
  } = props
  const { id, sentence, aria } = describeField(props)
  return (
    <FieldFrame {...{ id, label, hint, sentence, optional, width }}>
      <input
        id={id}
        name={name}
        type="file"
        required={!optional}
        className={classNames(
          controlClass,
          'text-15 file:mr-3 file:border file:border-quiet file:bg-transparent file:px-3 file:py-1 file:text-ink',
          className,
        )}
        {...aria}
        {...input}
      />
    </FieldFrame>
  )
}
