import { Stack } from '@/components/ui/columns'
import { Notice } from '@/components/ui/notice'
import { withParams } from '@/components/ui/with-params'
import type { PackSummary, QueueQuery } from '@/lib/contracts/packing'
import type { Actor } from '@/lib/core/policy/can'
import { packingWords as words } from '@/lib/messages/packing'
import { paths } from '@/lib/paths'
import { listBatches } from '@/lib/queries/packing/list-batches'
import { listPackGroups } from '@/lib/queries/packing/list-pack-groups'
import { listPackQueue } from '@/lib/queries/packing/list-pack-queue'
import { listPackers } from '@/lib/queries/packing/list-packers'
import { listStoppedOrders } from '@/lib/queries/packing/list-stopped-orders'
import { BatchPapers } from './batch-papers'
import { BatchesTable } from './batches-table'
import { GroupsTable } from './groups-table'
import { QueueFilter } from './queue-filter'
import { QueueTable } from './queue-table'
import { StoppedSheet } from './stopped-sheet'
import { TakeForm } from './take-form'

type Props = { actor: Actor; workshopId: string; slug: string; query: QueueQuery; summary: PackSummary }

/** What can be packed now, what is taken already, and what cannot be packed with the reason. */
export async function QueueSheet({ actor, workshopId, slug, query, summary }: Props) {
  const asked = { actor, workshopId }
  const { items, next } = await listPackQueue({ ...asked, query })
  const groups = await listPackGroups({ ...asked, query })
  const batches = await listBatches(asked)
  const stopped = await listStoppedOrders(asked)
  const here = (changes: Record<string, string | null>) => withParams(paths.packing(slug), query, changes)
  const isAllPosted = summary.toPack === 0 && summary.packed === 0 && stopped.length === 0
  if (isAllPosted && summary.progress.length > 0)
    return (
      <Stack>
        <Notice kind="done" title={words.allPosted}>
          {words.allPostedWords}
        </Notice>
        <BatchesTable slug={slug} batches={batches} />
      </Stack>
    )
  return (
    <Stack>
      <TakeForm slug={slug} query={query} packers={await listPackers(asked)} actor={actor} />
      <BatchesTable slug={slug} batches={batches} />
      <BatchPapers slug={slug} query={query} />
      <GroupsTable slug={slug} query={query} groups={groups} />
      <QueueTable
        slug={slug}
        items={items}
        filter={<QueueFilter slug={slug} query={query} summary={summary} />}
        empty={Object.values(query).some(Boolean) ? words.empty.filtered : words.empty.queue}
        firstHref={query.after ? here({ after: null }) : undefined}
        nextHref={next ? here({ after: next }) : undefined}
      />
      <StoppedSheet slug={slug} orders={stopped} />
    </Stack>
  )
}
