import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { BulkProgressLine } from '@/components/run/bulk-progress-line'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import { uuid } from '@/lib/contracts/fields'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getBulk } from '@/lib/queries/bulk/get-bulk'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { FailureTable } from './_parts/failure-table'

export const metadata: Metadata = { title: words.bulkTitle }

type Props = { params: Promise<{ workshop: string; bulk: string }> }

export default async function BulkPage({ params }: Props) {
  const { workshop: slug, bulk: id } = await params
  const actor = await signedIn(paths.adminBulk(slug, id))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'bulk:read' })
  if (!workshop || !uuid.safeParse(id).success) notFound()
  const bulk = await getBulk({ actor, workshopId: workshop.id, bulkId: id })
  if (!bulk) notFound()
  const { kind, total, done, failed, failures, run } = bulk
  const title = words.bulkKinds[kind] ?? words.bulkTitle
  return (
    <>
      <PageHead
        title={title}
        lead={words.bulkLead}
        trail={[{ href: paths.adminRuns(slug), label: words.title }]}
      />
      <Stack>
        <BulkProgressLine workshop={slug} bulk={id} label={title} known={{ total, done, failed }} />
        <FailureTable failures={failures} />
        <div className="flex flex-wrap gap-3">
          {run === null ? null : <LinkButton href={paths.adminRun(slug, run)}>{words.back}</LinkButton>}
          <LinkButton href={paths.adminBulk(slug, id)} kind="plain">
            {words.bulkAgain}
          </LinkButton>
        </div>
      </Stack>
    </>
  )
}
