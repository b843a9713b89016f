import { Button } from '@/components/ui/button'
import { ChoiceField } from '@/components/ui/choice-field'
import { Form } from '@/components/ui/form'
import { type FormState, typedText } from '@/components/ui/form-state'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import { TextArea } from '@/components/ui/text-area'
import { MoneyField } from '@/components/ui/text-field'
import { type ProblemView, REMEDIES } from '@/lib/contracts/problems'
import { problemWords as words } from '@/lib/messages/problems'
import { paths } from '@/lib/paths'

type Props = { slug: string; problem: ProblemView; form?: FormState }

/** What is done about one report. */
export function AnswerForm({ slug, problem, form }: Props) {
  return (
    <Sheet title={words.answerTitle(problem.number, problem.orderNumber)} id="answer">
      <p className="font-semibold">{words.kinds[problem.kind]}</p>
      <PlainText text={problem.story} />
      <Form
        action={paths.api.adminProblemAnswer(slug, problem.problem)}
        form={form}
        hidden={{ currency: problem.currency }}
        foot={<Button>{words.send}</Button>}
      >
        <ChoiceField
          name="remedy"
          label={words.remedy}
          form={form}
          chosen={typedText(form, 'remedy')}
          choices={REMEDIES.map((value) => ({
            value,
            label: words.remedies[value],
            hint: words.remedyHints[value] || undefined,
          }))}
        />
        <MoneyField name="refundMinor" label={words.sum} currency={problem.currency} form={form} optional />
        <TextArea name="answer" label={words.answer} form={form} rows={5} />
      </Form>
    </Sheet>
  )
}
