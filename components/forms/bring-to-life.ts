import { toNestErrors } from '@hookform/resolvers'
import { createFormControl, type FieldErrors } from 'react-hook-form'
import type { z } from 'zod'
import { fieldsToBody } from '@/lib/contracts/form-fields'
import type { Problem } from '@/lib/contracts/problem'
import { ui } from '@/lib/messages/ui'
import { paths } from '@/lib/paths'
import { FORM_CONTRACTS, type FormName } from './form-contracts'
import { showFieldErrors } from './show-field-errors'

type Sentences = Record<string, string>

/**
 * Makes a form of plain HTML answer in place: checked against its contract, sent in the background, the server's
 * sentences back at their fields, then on to the page the server names. Without this the browser posts it itself.
 */
export function bringToLife(
  form: HTMLFormElement,
  name: FormName,
  summarise: (errors: Sentences) => void,
  leaving: AbortSignal,
): void {
  const contract = FORM_CONTRACTS[name]()
  const life = createFormControl<Record<string, unknown>>({
    mode: 'onSubmit',
    reValidateMode: 'onChange',
    shouldFocusError: false,
    resolver: async (_values, _context, options) => {
      const found = mistakesOf(form, await contract)
      const errors = Object.fromEntries(
        Object.entries(found).map(([path, message]) => [path, { type: 'contract', message }]),
      )
      return Object.keys(found).length > 0
        ? { values: {}, errors: toNestErrors(errors as FieldErrors, options) }
        : { values: {}, errors: {} }
    },
  })
  for (const control of namedControls(form)) {
    const { ref, onChange, onBlur } = life.register(control.name)
    ref(control)
    control.addEventListener('input', (event) => void onChange(event), { signal: leaving })
    control.addEventListener('focusout', (event) => void onBlur(event), { signal: leaving })
  }
  const stop = life.subscribe({
    formState: { errors: true },
    callback: ({ errors }) => showFieldErrors(form, flatten(errors ?? {})),
  })
  leaving.addEventListener('abort', stop)

  const refuse = (errors: Sentences) => {
    showFieldErrors(form, errors)
    summarise({ ...errors })
  }
  form.addEventListener(
    'submit',
    (event) => {
      event.preventDefault()
      const button = event.submitter
      void life.handleSubmit(
        () => send(form, button, refuse),
        (errors) => refuse(flatten(errors)),
      )()
    },
    { signal: leaving },
  )
}

async function send(form: HTMLFormElement, button: HTMLElement | null, refuse: (errors: Sentences) => void) {
  const fields = new URLSearchParams(pairsOf(form))
  if (button instanceof HTMLButtonElement && button.name) fields.set(button.name, button.value)
  button?.setAttribute('aria-disabled', 'true')
  try {
    const answer = await fetch(form.action, {
      method: 'POST',
      body: fields,
      headers: { accept: 'application/json' },
    })
    if (answer.ok) {
      location.assign(answer.headers.get('x-next') ?? location.href)
      return
    }
    const problem = (await answer.json()) as Problem
    if (problem.reason === 'second_factor') return location.assign(paths.secondFactor(location.pathname))
    const errors =
      problem.errors && Object.keys(problem.errors).length > 0 ? problem.errors : { '': problem.title }
    refuse(errors)
  } catch {
    refuse({ '': ui.notSent })
  } finally {
    button?.removeAttribute('aria-disabled')
  }
}

function mistakesOf(form: HTMLFormElement, contract: z.ZodType): Sentences {
  const { body, errors } = fieldsToBody(pairsOf(form))
  const read = contract.safeParse(body)
  const found: Sentences = {}
  for (const issue of read.error?.issues ?? []) found[issue.path.join('.')] ??= issue.message
  return { ...found, ...errors }
}

function pairsOf(form: HTMLFormElement): [string, string][] {
  return [...new FormData(form)].map(([name, value]) => [name, typeof value === 'string' ? value : ''])
}

function namedControls(form: HTMLFormElement) {
  const isControl = (element: Element) =>
    element instanceof HTMLInputElement ||
    element instanceof HTMLSelectElement ||
    element instanceof HTMLTextAreaElement
  return [...form.elements].filter(isControl).filter((control) => control.name && control.type !== 'hidden')
}

/** Nested errors back to one sentence per dotted path. */
function flatten(errors: object, before = ''): Sentences {
  return Object.entries(errors).reduce<Sentences>((found, [name, value]) => {
    if (typeof value !== 'object' || value === null || name === 'ref') return found
    const path = before ? `${before}.${name}` : name
    const { message } = value as { message?: unknown }
    if (typeof message === 'string') return { ...found, [path]: message }
    return { ...found, ...flatten(value, path) }
  }, {})
}
