import { z } from 'zod'
import { minorAmount, paragraphs } from './fields'

export const PROBLEM_KINDS = ['missing_part', 'fault', 'wrong', 'damaged', 'lost', 'other'] as const
export type ProblemKind = (typeof PROBLEM_KINDS)[number]
export const REMEDIES = ['replacement', 'part', 'repair', 'part_refund', 'full_refund', 'message'] as const
export type Remedy = (typeof REMEDIES)[number]

/** What a buyer reports of an order that was posted. */
export const ReportProblemInput = z.object({
  kind: z.enum(PROBLEM_KINDS, { error: 'Choose what is wrong.' }),
  story: paragraphs(5000, 1, 'Say what happened, in your words.'),
})
export type ReportProblemInput = z.infer<typeof ReportProblemInput>

/** What the owner answers; the sum for a part refund only. */
export const AnswerProblemInput = z.object({
  remedy: z.enum(REMEDIES, { error: 'Choose what you do about it.' }),
  answer: paragraphs(5000, 1, 'Write a sentence to the buyer.'),
  currency: z.string().optional(),
  refundMinor: z.preprocess(
    (typed) => (typed === '' || typed === undefined ? undefined : typed),
    minorAmount().optional(),
  ),
})
export type AnswerProblemInput = z.infer<typeof AnswerProblemInput>

/** A problem as its buyer and the owner read it. */
export type ProblemView = {
  problem: string
  number: number
  order: string
  orderNumber: string
  kind: ProblemKind
  story: string
  state: 'open' | 'answered' | 'closed'
  remedy: Remedy | null
  answer: string | null
  openedAt: string
  answerBy: string
  currency: string
}
