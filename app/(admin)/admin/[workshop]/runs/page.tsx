import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { signedIn } from '@/app/_parts/signed-in'
import { ButtonRow, LinkButton } from '@/components/ui/button'
import { PageHead } from '@/components/ui/page-head'
import { uuid } from '@/lib/contracts/fields'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { listRuns } from '@/lib/queries/runs/list-runs'
import { getDeskWorkshop } from '@/lib/queries/workshops/get-desk-workshop'
import { RunTable } from './_parts/run-table'

export const metadata: Metadata = { title: words.title }

type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<{ after?: string }> }

export default async function RunsPage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  const { after } = await searchParams
  const actor = await signedIn(paths.adminRuns(slug))
  const workshop = await getDeskWorkshop({ actor, slug, deed: 'run:list' })
  if (!workshop) notFound()
  const known = uuid.safeParse(after)
  const runs = await listRuns({
    actor,
    workshopId: workshop.id,
    after: known.success ? known.data : undefined,
  })
  return (
    <>
      <PageHead
        title={words.title}
        lead={words.listLead}
        aside={
          <ButtonRow>
            <LinkButton href={paths.adminRecord(slug)}>{words.record}</LinkButton>
            <LinkButton href={paths.adminRunNew(slug)} kind="primary">
              {words.newTitle}
            </LinkButton>
          </ButtonRow>
        }
      />
      <RunTable workshop={slug} {...runs} isFirst={after === undefined} />
    </>
  )
}
