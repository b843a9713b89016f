import { queryOptions } from '@tanstack/react-query'
import type { BulkProgress } from '@/lib/contracts/runs'
import { paths } from '@/lib/paths'

/** How often a page asks how far the work is. */
const EVERY_MS = 1500

const isOver = ({ total, done, failed }: BulkProgress) => done + failed >= total

/** How far a deed on many rows is; asked again until nothing waits any more. */
export const bulkQuery = (workshop: string, bulk: string, known: BulkProgress) =>
  queryOptions({
    queryKey: ['bulk', workshop, bulk],
    queryFn: async ({ signal }): Promise<BulkProgress> => {
      const answer = await fetch(paths.api.adminBulk(workshop, bulk), { signal })
      if (!answer.ok) throw new Error(`the progress of ${bulk} answers ${answer.status}`)
      return (await answer.json()) as BulkProgress
    },
    initialData: known,
    refetchInterval: ({ state }) => (state.data && isOver(state.data) ? false : EVERY_MS),
  })
