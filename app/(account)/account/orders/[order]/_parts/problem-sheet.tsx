import { Button } from '@/components/ui/button'
import { DayText } from '@/components/format/day-text'
import { keptForm } from '@/components/forms/kept-form'
import { ChoiceField } from '@/components/ui/choice-field'
import { Disclosure } from '@/components/ui/disclosure'
import { Form } from '@/components/ui/form'
import { typedText } from '@/components/ui/form-state'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import type { OrderPageView } from '@/lib/contracts/order-page'
import { PROBLEM_KINDS } from '@/lib/contracts/problems'
import { problemWords as words } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'
import { listOrderProblems } from '@/lib/queries/problems/list-problems'

/** What the buyer reported and what came of it, and a form for more; nothing before something was handed over. */
export async function ProblemSheet({ order, draft }: { order: OrderPageView; draft?: string }) {
  if (!order.parcels.some(({ handedOverAt }) => handedOverAt !== null)) return null
  const problems = await listOrderProblems(order.id)
  const form = keptForm(await getFormDraft(draft, 'problem'))
  return (
    <Sheet title={words.title} id="problems">
      <ul>
        {problems.map((problem) => (
          <li key={problem.problem} className="border-b border-rule py-3">
            <p className="font-semibold">
              {words.kinds[problem.kind]}: {words.states[problem.state]}
            </p>
            <PlainText text={problem.story} />
            {problem.remedy === null ? (
              <p className="text-15 text-quiet">
                {words.answerBy} <DayText day={problem.answerBy} />
              </p>
            ) : (
              <>
                <p className="pt-2 font-semibold">{words.remediesForBuyer[problem.remedy]}</p>
                <PlainText text={problem.answer ?? ''} />
              </>
            )}
          </li>
        ))}
      </ul>
      <Disclosure summary={words.report} open={form !== undefined}>
        <p className="max-w-words pb-3 text-15 text-quiet">{words.reportHint}</p>
        <Form action={paths.api.orderProblems(order.id)} form={form} foot={<Button>{words.button}</Button>}>
          <ChoiceField
            name="kind"
            label={words.kind}
            form={form}
            chosen={typedText(form, 'kind')}
            choices={PROBLEM_KINDS.map((value) => ({ value, label: words.kinds[value] }))}
          />
          <TextArea name="story" label={words.story} hint={words.storyHint} form={form} rows={5} />
        </Form>
      </Disclosure>
    </Sheet>
  )
}
