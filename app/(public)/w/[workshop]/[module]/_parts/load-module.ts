import { cache } from 'react'
import { businessNow } from '@/lib/http/business-now'
import { getModulePage } from '@/lib/queries/public/get-module-page'

/** The page's one query, asked once for its head and its body. */
export const loadModule = cache(async (workshop: string, module: string) =>
  getModulePage({ workshop, module, now: await businessNow() }),
)
