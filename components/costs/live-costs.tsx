'use client'
import { useEffect, useRef, useState } from 'react'
import type { CostFigures } from '@/lib/contracts/cost-desk'
import { formatMoney } from '@/lib/core/money/format'
import { costWords as words } from '@/lib/messages/costs'
import { CostSheets } from './cost-sheets'

type Props = {
  figures: CostFigures | null
  /** Answers with the figures of the plan as it is typed. */
  tryAt: string
  /** The form that asks for the quantity, above the sheets. */
  question: React.ReactNode
  /** The form of the plan, below them. */
  children: React.ReactNode
}

/** Long enough for a second digit, short enough that the figures seem to follow the hand. */
const PAUSE_MS = 60

/** The sheets of costs, which follow the forms below them while they are filled in. Without script they show what is saved. */
export function LiveCosts({ figures: first, tryAt, question, children }: Props) {
  const [figures, setFigures] = useState(first)
  const [isUnread, setUnread] = useState(false)
  const [isChanged, setChanged] = useState(false)
  const forms = useRef<HTMLDivElement>(null)
  useEffect(() => {
    const place = forms.current
    if (!place) return
    const leaving = new AbortController()
    let waiting: ReturnType<typeof setTimeout> | undefined
    let asking: AbortController | undefined
    const ask = async () => {
      asking?.abort()
      asking = new AbortController()
      const answer = await fetch(tryAt, {
        method: 'POST',
        body: fieldsOf(place),
        headers: { accept: 'application/json' },
        signal: AbortSignal.any([asking.signal, leaving.signal]),
      }).catch(() => null)
      if (!answer) return
      setUnread(!answer.ok)
      if (answer.ok) setFigures((await answer.json()) as CostFigures)
    }
    const changed = () => {
      setChanged(true)
      clearTimeout(waiting)
      waiting = setTimeout(() => void ask(), PAUSE_MS)
    }
    place.addEventListener('input', changed, { signal: leaving.signal })
    return () => {
      clearTimeout(waiting)
      leaving.abort()
    }
  }, [tryAt])
  return (
    <div ref={forms} className="flex flex-col gap-6">
      {question}
      {figures ? <CostSheets figures={figures} /> : null}
      <div className="print:hidden">{children}</div>
      {isChanged && figures ? <LiveLine figures={figures} isUnread={isUnread} /> : null}
    </div>
  )
}

function LiveLine({ figures, isUnread }: { figures: CostFigures; isUnread: boolean }) {
  const { units, totals, breakEven, currency, locale } = figures
  const sum = formatMoney(Math.abs(totals.profit), currency, locale)
  return (
    <p
      role="status"
      className="sticky bottom-0 z-10 border-t-2 border-ink bg-sheet px-4 py-3 print:hidden"
      data-live-costs
    >
      <span className="figures">{words.live(units, sum, totals.profit < 0, breakEven.safeFrom)}</span>{' '}
      <span className="text-quiet">{isUnread ? words.unread : words.unsaved}</span>
    </p>
  )
}

/** The fields of every form in place, as one body. */
function fieldsOf(place: HTMLElement): URLSearchParams {
  const fields = new URLSearchParams()
  for (const form of place.querySelectorAll('form'))
    for (const [name, value] of new FormData(form)) if (typeof value === 'string') fields.append(name, value)
  return fields
}
