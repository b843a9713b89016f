'use client'
import { useState } from 'react'
import { ui } from '@/lib/messages/ui'

/** A piece of text to take along: selectable as it stands, with a button where the browser can copy. */
export function CopyText({ text, label }: { text: string; label: string }) {
  const [copied, setCopied] = useState(false)
  const copy = () => {
    // A refused clipboard leaves the text selectable, which is all the button saves.
    navigator.clipboard?.writeText(text).then(
      () => setCopied(true),
      () => setCopied(false),
    )
  }
  return (
    <span className="inline-flex max-w-full flex-wrap items-baseline gap-x-3">
      <span className="figures min-w-0 break-all select-all">{text}</span>
      <button
        type="button"
        onClick={copy}
        className="text-15 text-tide bench:min-h-14 min-h-6 underline underline-offset-4 print:hidden"
      >
        {copied ? ui.copied : ui.copy} <span className="sr-only">{label}</span>
      </button>
      <span role="status" className="sr-only">
        {copied ? ui.copied : ''}
      </span>
    </span>
  )
}
