import { DayText } from '@/components/format/day-text'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { ErrorSummary } from '@/components/ui/error-summary'
import { Form } from '@/components/ui/form'
import { DateField } from '@/components/ui/text-field'
import type { RunPage } from '@/lib/contracts/run-page'
import { callOffDueOn, DECIDE_BY_MOVE_DAYS } from '@/lib/core/states/run-changes'
import { addDays } from '@/lib/core/time/day'
import { runWords as words } from '@/lib/messages/runs'
import { writtenDay } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

type Ask = { page: RunPage; here: string; typed?: string | undefined; wrong?: string | null | undefined }

/** Which day: nothing is changed yet, so it is asked by a plain address that can be gone back to. */
export function AskDecideBy({ page, here, typed, wrong }: Ask) {
  const latest = writtenDay(addDays(page.decideBy, DECIDE_BY_MOVE_DAYS))
  return (
    <form action={here} method="get" noValidate className="flex flex-col gap-5">
      {wrong ? <ErrorSummary errors={{ decideBy: wrong }} /> : null}
      <DateField
        name="decideBy"
        label={words.newDecideBy}
        hint={words.newDecideByHint(writtenDay(page.decideBy), latest)}
        defaultValue={typed}
        error={wrong ?? undefined}
      />
      <div>
        <Button kind="secondary">{words.goOn}</Button>
      </div>
    </form>
  )
}

type Check = { page: RunPage; decideBy: string; here: string }

/** What the new day means, read once more. */
export function CheckDecideBy({ page, decideBy, here }: Check) {
  const { workshop, id, figures, minimum } = page
  return (
    <Form
      action={paths.api.adminRunDeed(workshop.slug, id, 'move-decide-by')}
      hidden={{ decideBy }}
      foot={<Button>{words.moveDecideByButton(writtenDay(decideBy))}</Button>}
    >
      <CheckAnswers
        answers={[
          {
            key: 'decideBy',
            question: words.newDecideBy,
            answer: <DayText day={decideBy} />,
            changeHref: here,
          },
          { key: 'before', question: words.decideBySoFar, answer: <DayText day={page.decideBy} /> },
          {
            key: 'callOff',
            question: words.callsItselfOff,
            answer: <DayText day={callOffDueOn(decideBy)} />,
          },
          {
            key: 'deposited',
            question: words.deposited,
            answer: words.depositedOf(figures.deposited, minimum),
          },
        ]}
      />
    </Form>
  )
}
