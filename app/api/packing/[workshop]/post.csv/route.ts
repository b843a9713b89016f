import { z } from 'zod'
import { slug } from '@/lib/contracts/fields'
import { POST_COLUMNS, PostQuery } from '@/lib/contracts/tracking'
import { csv } from '@/lib/http/csv'
import { route } from '@/lib/http/route'
import { postWords } from '@/lib/messages/post'
import { listPostRows } from '@/lib/queries/packing/list-post-rows'

export const GET = route(
  { deed: 'post:export', params: z.object({ workshop: slug }), query: PostQuery },
  async ({ actor, workshop, query, now }) => {
    const rows = await listPostRows({ actor, workshopId: workshop.id, query, now })
    const columns = query.columns ?? POST_COLUMNS
    return csv(
      columns.map((column) => postWords.csv.columns[column]),
      rows.map((row) => columns.map((column) => row[column])),
      'parcels.csv',
    )
  },
)
