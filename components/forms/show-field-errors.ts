import { fieldId } from '@/components/ui/form-state'
import { ui } from '@/lib/messages/ui'

/** Puts each sentence at its field, in the place and words the server would use, and takes the old ones away. */
export function showFieldErrors(form: HTMLFormElement, errors: Readonly<Record<string, string>>): void {
  for (const old of form.querySelectorAll('[id$="-error"]')) old.remove()
  for (const control of form.querySelectorAll('[aria-invalid]')) {
    control.removeAttribute('aria-invalid')
    describe(control, (ids) => ids.filter((id) => !id.endsWith('-error')))
  }
  for (const [name, sentence] of Object.entries(errors)) {
    const id = fieldId(name)
    const control = form.querySelector(`#${CSS.escape(id)}`)
    if (!control) continue
    const words = document.createElement('p')
    words.id = `${id}-error`
    words.className = 'px-3 pt-1 text-15 text-rust font-semibold'
    words.textContent = `▲ ${ui.errorPrefix} ${sentence}`
    const place = control.closest('.below-line, fieldset') ?? control
    place.append(words)
    control.setAttribute('aria-invalid', 'true')
    describe(control, (ids) => [...ids, words.id])
  }
}

function describe(control: Element, change: (ids: string[]) => string[]): void {
  const ids = change((control.getAttribute('aria-describedby') ?? '').split(' ').filter(Boolean))
  if (ids.length > 0) control.setAttribute('aria-describedby', ids.join(' '))
  else control.removeAttribute('aria-describedby')
}
