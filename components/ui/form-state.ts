/** What a form comes back with: the values as typed and a sentence per field that needs changing. */
export type FormState = {
  readonly values?: Readonly<Record<string, unknown>>
  readonly errors?: Readonly<Record<string, string>>
}

/** What every field takes. `name` is the path in the body ('lines.0.quantity'); `form` brings back what was typed. */
export type FieldProps = {
  name: string
  label: React.ReactNode
  hint?: React.ReactNode
  form?: FormState
  /** Stands in for `form.errors[name]`. */
  error?: string
  id?: string
  optional?: boolean
  width?: 'short' | 'medium' | 'full'
}

/** The id of a field, so that an error summary can link to it. */
export function fieldId(name: string): string {
  return `f-${name.replaceAll(/[^A-Za-z0-9_-]/g, '-')}`
}

/** The ids and sentences a field is described by. */
export function describeField({ name, id, hint, form, error }: FieldProps) {
  const own = id ?? fieldId(name)
  const sentence = error ?? form?.errors?.[name]
  const described = [hint ? `${own}-hint` : '', sentence ? `${own}-error` : ''].filter(Boolean).join(' ')
  return {
    id: own,
    sentence,
    aria: {
      'aria-describedby': described || undefined,
      'aria-invalid': sentence ? (true as const) : undefined,
    },
  }
}

/** What was typed before, as text; undefined when nothing came back. */
export function typedText(form: FormState | undefined, name: string): string | undefined {
  const value = form?.values?.[name]
  return value === undefined || value === null ? undefined : String(value)
}

/** Several values typed under one name (ticked boxes). */
export function typedList(form: FormState | undefined, name: string): string[] | undefined {
  const value = form?.values?.[name]
  if (value === undefined || value === null) return undefined
  return Array.isArray(value) ? value.map(String) : [String(value)]
}
