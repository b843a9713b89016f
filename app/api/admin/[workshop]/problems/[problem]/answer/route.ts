import { z } from 'zod'
import { slug, uuid } from '@/lib/contracts/fields'
import { AnswerProblemInput } from '@/lib/contracts/problems'
import { route } from '@/lib/http/route'
import { paths } from '@/lib/paths'
import { answerProblem } from '@/lib/services/problems/answer-problem'

export const POST = route(
  {
    deed: 'problem:answer',
    params: z.object({ workshop: slug, problem: uuid }),
    body: AnswerProblemInput,
    form: {
      name: 'answer-problem',
      back: ({ params, draft }) =>
        `${paths.adminProblems(params.workshop)}?problem=${params.problem}&draft=${draft}#answer`,
      done: ({ params }) => `${paths.adminProblems(params.workshop)}?saved=answer`,
    },
  },
  ({ actor, workshop, params, body, now }) =>
    answerProblem({ actor, workshopId: workshop.id, problemId: params.problem, input: body, now }),
)
