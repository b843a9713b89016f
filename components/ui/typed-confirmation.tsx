import { ui } from '@/lib/messages/ui'
import { TextField } from './text-field'
import type { FieldProps } from './form-state'

type Props = Omit<FieldProps, 'label' | 'hint'> & { words: string; hint?: React.ReactNode }

/** Asks for given words to be typed before a deed that cannot be taken back; the server compares them again. */
export function TypedConfirmation({ words, ...field }: Props) {
  return (
    <TextField
      {...field}
      label={
        <>
          {ui.typeToConfirm} <span className="figures select-none">{words}</span>
        </>
      }
      autoComplete="off"
      autoCapitalize="none"
      spellCheck={false}
      className="figures"
    />
  )
}
