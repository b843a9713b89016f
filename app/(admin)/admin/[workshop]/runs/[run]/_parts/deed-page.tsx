import { RunStateMark } from '@/components/run/run-state'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import type { RunPage } from '@/lib/contracts/run-page'
import { reasonWords } from '@/lib/messages/reasons'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Props = {
  page: RunPage
  title: string
  lead: string
  /** False where the run's state does not allow the deed: then it says so instead of asking. */
  isPossible: boolean
  children: React.ReactNode
}

/** The frame of a page that asks once more before a deed. */
export function DeedPage({ page, title, lead, isPossible, children }: Props) {
  const { workshop, module, id, number, state } = page
  const back = paths.adminRun(workshop.slug, id)
  return (
    <>
      <PageHead
        title={title}
        lead={isPossible ? lead : reasonWords('not_allowed')}
        trail={[
          { href: paths.adminRuns(workshop.slug), label: words.title },
          { href: back, label: words.runTitle(module.name, number) },
        ]}
        aside={<RunStateMark state={state} />}
      />
      <Stack>
        {isPossible ? children : null}
        <div>
          <LinkButton href={back} kind="plain">
            {words.back}
          </LinkButton>
        </div>
      </Stack>
    </>
  )
}
