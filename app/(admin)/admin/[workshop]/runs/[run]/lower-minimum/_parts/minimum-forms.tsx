import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { ErrorSummary } from '@/components/ui/error-summary'
import { Form } from '@/components/ui/form'
import { NumberField } from '@/components/ui/text-field'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Ask = { here: string; typed?: string | undefined; wrong?: string | undefined }

/** Which minimum: nothing is changed yet, so it is asked by a plain address that can be gone back to. */
export function AskMinimum({ here, typed, wrong }: Ask) {
  return (
    <form action={here} method="get" noValidate className="flex flex-col gap-5">
      {wrong ? <ErrorSummary errors={{ minimum: wrong }} /> : null}
      <NumberField
        name="minimum"
        label={words.newMinimum}
        hint={words.newMinimumHint}
        defaultValue={typed}
        error={wrong}
      />
      <div>
        <Button kind="secondary">{words.goOn}</Button>
      </div>
    </form>
  )
}

/** What the new minimum means, read once more. */
export function CheckMinimum({ page, minimum, here }: { page: RunPage; minimum: number; here: string }) {
  const { workshop, id, figures } = page
  return (
    <Form
      action={paths.api.adminRunDeed(workshop.slug, id, 'lower-minimum')}
      hidden={{ minimum: String(minimum) }}
      foot={<Button>{words.lowerMinimumButton(page.minimum, minimum)}</Button>}
    >
      <CheckAnswers
        answers={[
          { key: 'minimum', question: words.newMinimum, answer: minimum, changeHref: here },
          { key: 'before', question: words.minimumSoFar, answer: page.minimum },
          { key: 'deposited', question: words.deposited, answer: figures.deposited },
          { key: 'breakEven', question: words.breakEven, answer: figures.breakEven ?? words.notKnown },
        ]}
      />
      {figures.breakEven !== null && minimum < figures.breakEven ? (
        <p className="max-w-words">{words.belowBreakEven(figures.breakEven)}</p>
      ) : null}
    </Form>
  )
}
