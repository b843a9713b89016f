'use client'
import { useId, useRef } from 'react'
import { ui } from '@/lib/messages/ui'
import { buttonClass, type ButtonKind } from './button'

type Props = {
  opener: React.ReactNode
  kind?: ButtonKind
  title: string
  /** The page that does the same without JavaScript; leave it out only where nothing is lost without the dialog. */
  href?: string
  children: React.ReactNode
}

/** A native modal dialog with the button that opens it; Escape and its own button close it, the focus goes back. */
export function Dialog({ opener, kind = 'secondary', title, href, children }: Props) {
  const box = useRef<HTMLDialogElement>(null)
  const titleId = useId()
  const open = (event: React.MouseEvent) => {
    event.preventDefault()
    box.current?.showModal()
  }
  return (
    <>
      {href ? (
        <a href={href} onClick={open} className={buttonClass(kind)}>
          {opener}
        </a>
      ) : (
        <button type="button" onClick={open} className={buttonClass(kind)}>
          {opener}
        </button>
      )}
      <dialog
        ref={box}
        aria-labelledby={titleId}
        className="border-ink bg-sheet text-ink backdrop:bg-ink/50 m-auto w-full max-w-xl border border-t-2 p-4 sm:p-6"
      >
        <h2 id={titleId} className="text-21">
          {title}
        </h2>
        <div className="py-3">{children}</div>
        <form method="dialog">
          <button className={buttonClass('secondary')}>{ui.close}</button>
        </form>
      </dialog>
    </>
  )
}
