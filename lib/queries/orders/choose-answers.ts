import { orderMistakes } from '@/lib/contracts/order-mistakes'
import type { QuotedOffer } from '@/lib/queries/orders/quote-data'
import type { ChosenAnswer } from '@/models/json'

/**
 * The answers of an order line: as chosen, or the default where nothing was chosen (always for a question that is asked
 * after the lock). A question without answer or default, and an answer that is not one of its own, is a mistake.
 */
export function chooseAnswers(
  offer: QuotedOffer,
  chosen: Readonly<Record<string, string>>,
  at: string,
): { choices: ChosenAnswer[]; errors: Record<string, string> } {
  const errors: Record<string, string> = {}
  const choices: ChosenAnswer[] = []
  for (const id of Object.keys(chosen))
    if (!offer.choices.some((choice) => choice.id === id)) errors[`${at}.${id}`] = orderMistakes.choice
  for (const choice of offer.choices) {
    const typed = chosen[choice.id] || undefined
    const answer = choice.answers.find(({ id, isDefault }) =>
      typed === undefined ? isDefault : id === typed,
    )
    if (!answer) errors[`${at}.${choice.id}`] = orderMistakes.choice
    else
      choices.push({
        choiceId: choice.id,
        question: choice.question,
        answerId: answer.id,
        label: answer.label,
        surchargeMinor: answer.surchargeMinor,
        isDefault: typed === undefined,
      })
  }
  return { choices, errors }
}
