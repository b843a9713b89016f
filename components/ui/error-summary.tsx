'use client'
import { useEffect, useRef } from 'react'
import { ui } from '@/lib/messages/ui'
import { Mark } from './state-mark'
import { fieldId } from './form-state'

type Props = {
  /** A sentence per field, by name; '' holds one that belongs to no field. */
  errors: Readonly<Record<string, string>>
  title?: string
}

/** What needs changing, on top of a form; takes the focus so that it is read first. Shows nothing without errors. */
export function ErrorSummary({ errors, title }: Props) {
  const box = useRef<HTMLDivElement>(null)
  const list = Object.entries(errors)
  useEffect(() => {
    if (Object.keys(errors).length > 0) box.current?.focus()
  }, [errors])
  if (list.length === 0) return null
  return (
    <div
      ref={box}
      role="alert"
      tabIndex={-1}
      autoFocus
      aria-labelledby="error-summary-title"
      className="border-rust bg-sheet border-2 px-4 py-3"
    >
      <h2 id="error-summary-title" className="text-17 text-rust flex items-baseline gap-2">
        <Mark kind="attention" />
        {title ?? ui.errorTitle(list.length)}
      </h2>
      <ul className="mt-2 space-y-1">
        {list.map(([name, sentence]) => (
          <li key={name}>
            {name ? (
              <a href={`#${fieldId(name)}`} className="text-rust">
                {sentence}
              </a>
            ) : (
              sentence
            )}
          </li>
        ))}
      </ul>
    </div>
  )
}
