import { ui } from '@/lib/messages/ui'
import { classNames } from './class-names'
import { Mark } from './state-mark'

const widths = { short: 'max-w-56', medium: 'max-w-md', full: 'max-w-none' }

type Props = {
  id: string
  label: React.ReactNode
  hint?: React.ReactNode
  sentence?: string
  optional?: boolean
  width?: 'short' | 'medium' | 'full'
  children: React.ReactNode
}

/** The ruled box of one field: its label on the line, then hint, error and the control. */
export function FieldFrame({ id, label, hint, sentence, optional, width = 'medium', children }: Props) {
  return (
    <div className={classNames('below-line w-full', widths[width], sentence && 'line-rust')}>
      <div className="on-line">
        <label htmlFor={id} className="text-13 font-semibold">
          {label}
          {optional ? (
            <>
              {' '}
              <span className="text-quiet font-normal">({ui.optional})</span>
            </>
          ) : null}
        </label>
      </div>
      <FieldNotes id={id} hint={hint} sentence={sentence} className="px-3 pt-1" />
      {children}
    </div>
  )
}

/** Hint and error of a field, under the ids its control is described by. */
export function FieldNotes({
  id,
  hint,
  sentence,
  className,
}: Pick<Props, 'id' | 'hint' | 'sentence'> & { className?: string }) {
  if (!hint && !sentence) return null
  return (
    <div className={className}>
      {hint ? (
        <p id={`${id}-hint`} className="text-13 text-quiet">
          {hint}
        </p>
      ) : null}
      {sentence ? (
        <p id={`${id}-error`} className="text-15 text-rust flex items-baseline gap-1.5 font-semibold">
          <Mark kind="attention" />
          <span>
            <span className="sr-only">{ui.errorPrefix}</span> {sentence}
          </span>
        </p>
      ) : null}
    </div>
  )
}

/** What every control inside a frame looks like. */
export const controlClass =
  'block min-h-11 w-full min-w-0 rounded bg-transparent px-3 py-2 text-17 text-ink focus-visible:outline-offset-0 disabled:text-quiet bench:min-h-14 bench:text-21'
