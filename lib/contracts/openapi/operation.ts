import type { z } from 'zod'
import type { Deed } from '@/lib/core/policy/deeds'

/** One call of the API, as its route file answers it; the path with its parameters in braces. */
export type Operation = {
  method: 'GET' | 'POST' | 'PUT'
  path: `/api/${string}`
  summary: string
  /** Who may is read from the deed; 'self' where it is the signed-in person's own row, 'anybody' where nobody is asked. */
  deed: Deed | 'self' | 'anybody'
  query?: z.ZodObject
  body?: z.ZodType
  /** Takes an Idempotency-Key. */
  isIdempotent?: boolean
  /** What a success answers, in words; the type of lib/contracts it has. */
  answer: string
  status?: number
  /** Anything else than JSON. */
  media?: 'application/pdf'
}
