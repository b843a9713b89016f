import type { Metadata } from 'next'
import { MoveDecideByInput } from '@/lib/contracts/runs'
import { mayMoveDecideBy } from '@/lib/core/states/run-changes'
import { reasonWords } from '@/lib/messages/reasons'
import { moveDecideByReasons, runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { DeedMails } from '../_parts/deed-mails'
import { DeedPage } from '../_parts/deed-page'
import { runOfPage } from '../_parts/run-of-page'
import { AskDecideBy, CheckDecideBy } from './_parts/decide-by-forms'

export const metadata: Metadata = { title: words.moveDecideBy }

type Props = {
  params: Promise<{ workshop: string; run: string }>
  searchParams: Promise<{ decideBy?: string; draft?: string }>
}

export default async function MoveDecideByPage({ params, searchParams }: Props) {
  const { workshop, run } = await params
  const here = paths.adminRunDeed(workshop, run, 'move-decide-by')
  const { actor, page } = await runOfPage({ params, deed: 'run:move_decide_by', here })
  const { decideBy: typed, draft } = await searchParams
  const kept = await getFormDraft(draft, 'run-move-decide-by')
  const read = MoveDecideByInput.safeParse({ decideBy: typed })
  const may =
    read.success &&
    mayMoveDecideBy({
      ...page,
      proposed: read.data.decideBy,
      movedBefore: page.decideByMoved,
      postedBy: page.offers.map(({ postedBy }) => postedBy),
    })
  const wrong = !read.success
    ? read.error.issues[0]?.message
    : may && !may.ok
      ? (moveDecideByReasons[may.reason] ?? reasonWords(may.reason))
      : undefined
  return (
    <DeedPage
      page={page}
      title={words.moveDecideBy}
      lead={page.decideByMoved ? reasonWords('already_moved') : words.moveDecideByLead}
      isPossible={page.state === 'taking_deposits'}
    >
      {page.decideByMoved ? null : read.success && may && may.ok ? (
        <>
          <CheckDecideBy page={page} decideBy={read.data.decideBy} here={here} />
          <DeedMails
            {...{ actor, workshopId: page.workshop.id, runId: run }}
            ahead={{ deed: 'move_decide_by', decideBy: read.data.decideBy }}
          />
        </>
      ) : (
        <AskDecideBy
          page={page}
          here={here}
          typed={typed ?? kept?.values['decideBy']}
          wrong={typed === undefined ? kept && reasonWords(kept.reason) : wrong}
        />
      )}
    </DeedPage>
  )
}
