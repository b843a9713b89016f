'use client'
import { useEffect, useRef, useState } from 'react'
import { ErrorSummary } from '@/components/ui/error-summary'
import type { FormName } from './form-contracts'

type Props = {
  contract: FormName
  /** Sentences the server came back with. */
  errors?: Readonly<Record<string, string>>
}

const NONE = {}

/**
 * Stands in a form where its mistakes are summed up, and makes the form answer in place once somebody works on it:
 * what that needs is loaded on the first focus, so that reading a page costs nothing.
 */
export function LiveErrors({ contract, errors: sent = NONE }: Props) {
  const mark = useRef<HTMLSpanElement>(null)
  const [errors, setErrors] = useState(sent)
  useEffect(() => {
    const form = mark.current?.closest('form')
    if (!form) return
    const leaving = new AbortController()
    const wake = async () => {
      const { bringToLife } = await import('./bring-to-life')
      if (!leaving.signal.aborted) bringToLife(form, contract, setErrors, leaving.signal)
    }
    form.addEventListener('focusin', wake, { once: true, signal: leaving.signal })
    return () => leaving.abort()
  }, [contract])
  return (
    <>
      <span ref={mark} hidden />
      <ErrorSummary errors={errors} />
    </>
  )
}
