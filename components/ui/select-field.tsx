import { ui } from '@/lib/messages/ui'
import { FieldFrame, controlClass } from './field-frame'
import { classNames } from './class-names'
import { describeField, typedText, type FieldProps } from './form-state'

type Option = { value: string; label: string; disabled?: boolean }
type Select = Omit<React.ComponentProps<'select'>, 'form' | 'width' | 'name' | 'id' | 'children'>
type Props = FieldProps & Select & { options: readonly Option[]; empty?: string | false }

/** One of a list; starts at "Choose one" unless `empty` is false or a value is there. */
export function SelectField(props: Props) {
  const {
    name,
    label,
    hint,
    form,
    error: _error,
    id: _id,
    optional,
    width,
    options,
    empty,
    className,
    ...select
  } = props
  const { id, sentence, aria } = describeField(props)
  return (
    <FieldFrame {...{ id, label, hint, sentence, optional, width }}>
      <span className="block pr-2">
        <select
          id={id}
          name={name}
          required={!optional}
          className={classNames(controlClass, className)}
          {...aria}
          {...select}
          defaultValue={
            select.value === undefined ? (typedText(form, name) ?? select.defaultValue ?? '') : undefined
          }
        >
          {empty === false ? null : <option value="">{empty ?? ui.chooseOne}</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value} disabled={option.disabled}>
              {option.label}
            </option>
          ))}
        </select>
      </span>
    </FieldFrame>
  )
}
