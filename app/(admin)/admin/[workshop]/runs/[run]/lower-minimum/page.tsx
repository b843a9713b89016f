import type { Metadata } from 'next'
import { mayLowerMinimum } from '@/lib/core/states/run-changes'
import { LowerMinimumInput } from '@/lib/contracts/runs'
import { reasonWords } from '@/lib/messages/reasons'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedPage } from '../_parts/deed-page'
import { DeedMails } from '../_parts/deed-mails'
import { runOfPage } from '../_parts/run-of-page'
import { AskMinimum, CheckMinimum } from './_parts/minimum-forms'

export const metadata: Metadata = { title: words.lowerMinimum }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ minimum?: string; draft?: string }>
}

export default async function LowerMinimumPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'lower-minimum')
  const { actor, page } = await runOfPage({ params, deed: 'run:lower_minimum', here })
  const { minimum: typed, draft } = await searchParams
  const kept = await getFormDraft(draft, 'run-lower-minimum')
  const read = LowerMinimumInput.safeParse({ minimum: typed })
  const may = read.success && mayLowerMinimum({ ...page, proposed: read.data.minimum })
  const isPossible = page.state === 'taking_deposits' && page.minimum > 1
  return (
    <DeedPage page={page} title={words.lowerMinimum} lead={words.lowerMinimumLead} isPossible={isPossible}>
      {read.success && may && may.ok ? (
        <>
          <CheckMinimum page={page} minimum={read.data.minimum} here={here} />
          <DeedMails
            {...{ actor, workshopId: page.workshop.id, runId: run }}
            ahead={{ deed: 'lower_minimum', minimum: read.data.minimum }}
          />
        </>
      ) : (
        <AskMinimum
          here={here}
          typed={typed ?? kept?.values['minimum']}
          wrong={wrongOf(read, may, typed) ?? (kept ? reasonWords(kept.reason) : undefined)}
        />
      )}
    </DeedPage>
  )
}

function wrongOf(
  read: ReturnType<typeof LowerMinimumInput.safeParse>,
  may: false | ReturnType<typeof mayLowerMinimum>,
  typed: string | undefined,
): string | undefined {
  if (typed === undefined) return undefined
  if (!read.success) return read.error.issues[0]?.message
  return may && !may.ok ? reasonWords(may.reason) : undefined
}
