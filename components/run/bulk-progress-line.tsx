'use client'
import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query'
import { useState } from 'react'
import { Progress } from '@/components/ui/progress'
import type { BulkProgress } from '@/lib/contracts/runs'
import { runWords } from '@/lib/messages/runs'
import { bulkQuery } from './bulk-query'

type Props = { workshop: string; bulk: string; label: string; known: BulkProgress }

/** A progress line that keeps itself up to date. It starts with what the server knew, so nothing is lost without script. */
export function BulkProgressLine(props: Props) {
  const [client] = useState(() => new QueryClient())
  return (
    <QueryClientProvider client={client}>
      <Line {...props} />
    </QueryClientProvider>
  )
}

function Line({ workshop, bulk, label, known }: Props) {
  const { data } = useQuery(bulkQuery(workshop, bulk, known))
  const { total, done, failed } = data
  return (
    <>
      <Progress label={label} done={done + failed} total={total} failed={failed} />
      <p role="status" className="pt-2 text-15">
        {done + failed >= total ? runWords.bulkDone : ''}
      </p>
    </>
  )
}
