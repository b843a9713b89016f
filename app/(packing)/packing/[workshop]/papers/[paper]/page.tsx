import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { DayText } from '@/components/format/day-text'
import { BlockView } from '../../_parts/block-view'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { TitleBlock } from '@/components/ui/title-block'
import { paperKind, ParcelPaperQuery } from '@/lib/contracts/packing'
import { businessNow } from '@/lib/http/business-now'
import { packingWords } from '@/lib/messages/packing'
import { parcelPaperWords as words } from '@/lib/messages/parcel-papers'
import { paths } from '@/lib/paths'
import { BlockedNotice } from '../../_parts/blocked-notice'
import { packingDesk } from '../../_parts/packing-desk'
import { ParcelPaperHead } from '../../_parts/parcel-paper-head'
import { paperToPrint } from '../../_parts/paper-to-print'

export const metadata: Metadata = { title: packingWords.papersTitle }

type Props = {
  params: Promise<{ workshop: string; paper: string }>
  searchParams: Promise<Record<string, string | string[] | undefined>>
}

/** Papers of parcels as they print: a sheet each. */
export default async function ParcelPaperPage({ params, searchParams }: Props) {
  const { workshop: slug, paper } = await params
  const kind = paperKind.safeParse(paper)
  if (!kind.success) notFound()
  const { actor, workshop } = await packingDesk(slug, paths.packingPapers(slug, kind.data))
  const query = ParcelPaperQuery.safeParse(await searchParams).data ?? {}
  const asked = { actor, workshopId: workshop.id, kind: kind.data, query }
  const built = await paperToPrint({ ...asked, now: await businessNow() })
  if (!built) notFound()
  const { parts, issue } = built
  return (
    <>
      <ParcelPaperHead slug={slug} kind={kind.data} query={query} isCut={built.isCut} />
      <Stack>
        <BlockedNotice blocked={built.blocked} />
        {parts.length === 0 ? <Empty>{words.empty[kind.data]}</Empty> : null}
        {parts.map((part, index) => (
          <section
            key={index}
            aria-label={part.what}
            className={`border border-rule bg-sheet p-4 print:border-0 print:p-0 ${index < parts.length - 1 ? 'break-after-page' : ''}`}
          >
            {part.blocks.map((block, at) => (
              <BlockView key={at} block={block} />
            ))}
            <TitleBlock
              what={part.what}
              who={`${issue.workshop}, ${issue.printedBy}`}
              when={<DayText day={issue.printedOn} />}
              sheet={{ number: index + 1, of: parts.length }}
            />
          </section>
        ))}
      </Stack>
    </>
  )
}
