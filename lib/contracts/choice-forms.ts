import { z } from 'zod'
import { line, offerKind, tick, uuid, wholeNumber, type OfferKind } from './fields'
import { amountIn, currencyCode } from './plan-fields'
import { rows } from './rows'

/** The schema of the data holds so many. */
const MOST_ANSWERS = 4

const Answer = z.object({
  label: line(80, 'Write the answer.'),
  surcharge: z.string().max(30).optional(),
  isDefault: tick,
})

/** One question of an offer with its answers. A question is never changed, since orders name it: it is retired and asked anew. */
export const ChoiceInput = z
  .object({
    offer: offerKind,
    currency: currencyCode,
    question: line(120, 'Write the question.'),
    askedAfterLock: tick,
    answerWithinDays: z.preprocess(
      (typed) => (typed === '' || typed === undefined ? 14 : typed),
      wholeNumber(1, 90, 'Enter whole days, from 1 to 90.'),
    ),
    answers: rows(Answer, MOST_ANSWERS),
  })
  .transform(({ answers, ...choice }, check) => {
    const at = (path: (string | number)[], message: string) =>
      check.addIssue({ code: 'custom', path, message })
    if (answers.length < 2) at(['answers'], 'Write at least two answers.')
    const chosen = answers.flatMap(({ isDefault }, i) => (isDefault ? [i] : []))
    if (chosen.length > 1) at(['answers', chosen[1]!, 'isDefault'], 'One answer can stand in, not two.')
    if (choice.askedAfterLock && chosen.length === 0)
      at(['answers'], 'Tick the answer that stands in until somebody has chosen.')
    const labels = answers.map(({ label }) => label.toLowerCase())
    const twice = labels.findIndex((label, i) => labels.indexOf(label) !== i)
    if (twice >= 0) at(['answers', twice, 'label'], 'This answer stands here twice.')
    return {
      ...choice,
      answers: answers.map(({ label, surcharge, isDefault }) => ({
        label,
        isDefault,
        surchargeMinor: amountIn(choice.currency, surcharge, 'answers', check),
      })),
    }
  })
export type ChoiceInput = z.infer<typeof ChoiceInput>
export const ChoiceRetirement = z.object({ choice: uuid })

/** A question that is asked, as the owner's page shows it. */
export type ChoiceDesk = {
  id: string
  offer: OfferKind
  question: string
  askedAfterLock: boolean
  answerWithinDays: number
  answers: { id: string; label: string; surchargeMinor: number; isDefault: boolean }[]
}
