import { When } from '@/components/format/when'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

/** What is or was done to many orders at once, each with its progress. */
export function BulkSheet({ page }: { page: RunPage }) {
  const { bulk, workshop } = page
  if (bulk.length === 0) return null
  return (
    <Sheet title={words.bulk}>
      <ul className="border-t border-rule">
        {bulk.map(({ id, kind, total, done, failed, createdAt }) => (
          <li
            key={id}
            className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule py-2"
          >
            <a href={paths.adminBulk(workshop.slug, id)} className="inline-flex min-h-6">
              {words.bulkKinds[kind] ?? words.bulkTitle}
            </a>
            <span className="figures">{words.bulkProgress(done, total, failed)}</span>
            <span className="w-full text-13 text-quiet">
              <When at={createdAt} zone={workshop.timeZone} />
            </span>
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
