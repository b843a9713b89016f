import { LiveErrors } from '@/components/forms/live-errors'
import type { FormName } from '@/components/forms/form-contracts'
import { classNames } from './class-names'
import { ErrorSummary } from './error-summary'
import { ButtonRow } from './button'
import type { FormState } from './form-state'

type Props = Omit<React.ComponentProps<'form'>, 'action' | 'method' | 'form' | 'hidden'> & {
  action: string
  form?: FormState
  /** The contract the form is checked against in the browser; without one it is only posted. */
  contract?: FormName
  /** Values that go along unseen. */
  hidden?: Readonly<Record<string, string>>
  /** The buttons, under the fields. */
  foot: React.ReactNode
}

/**
 * A form that is posted by the browser itself: it works without JavaScript. The sentences come from the server, with
 * what was typed, so the browser's own bubbles stay away.
 */
export function Form({ action, form, contract, hidden = {}, foot, children, className, ...rest }: Props) {
  return (
    <form
      action={action}
      method="post"
      noValidate
      className={classNames('flex flex-col gap-5', className)}
      {...rest}
    >
      {contract ? (
        <LiveErrors contract={contract} errors={form?.errors} />
      ) : form?.errors && Object.keys(form.errors).length > 0 ? (
        <ErrorSummary errors={form.errors} />
      ) : null}
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {children}
      <div className="pt-1">
        <ButtonRow>{foot}</ButtonRow>
      </div>
    </form>
  )
}

type DeedFormProps = { action: string; hidden?: Readonly<Record<string, string>>; children: React.ReactNode }

/** One button that changes something, with nothing to fill in. */
export function DeedForm({ action, hidden = {}, children }: DeedFormProps) {
  return (
    <form action={action} method="post" className="flex flex-col sm:inline-flex print:hidden">
      {Object.entries(hidden).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      {children}
    </form>
  )
}
