'use client'
import { useEffect } from 'react'
import type { CheckAnswer } from '@/lib/contracts/orders'
import { paths } from '@/lib/paths'

const EVERY_MS = 1_500
const TRIES = 40

/** Asks until a payment has arrived, then shows the order anew. Without script the button beside it does the same. */
export function CheckPayment({ order, state }: { order: string; state: string }) {
  useEffect(() => {
    const leaving = new AbortController()
    const waiting = { timer: 0 }
    const look = async (tries: number) => {
      const now = await stateOf(order, leaving.signal)
      if (leaving.signal.aborted) return
      if (now !== null && now !== state) return location.replace(paths.accountOrder(order))
      if (tries > 1) waiting.timer = window.setTimeout(() => void look(tries - 1), EVERY_MS)
    }
    void look(TRIES)
    return () => {
      leaving.abort()
      window.clearTimeout(waiting.timer)
    }
  }, [order, state])
  return null
}

/** Null when nobody answers: the next look may. */
async function stateOf(order: string, signal: AbortSignal): Promise<string | null> {
  try {
    const answer = await fetch(paths.api.orderPaid(order), {
      method: 'POST',
      headers: { accept: 'application/json' },
      signal,
    })
    return answer.ok ? ((await answer.json()) as CheckAnswer).state : null
  } catch {
    return null
  }
}
