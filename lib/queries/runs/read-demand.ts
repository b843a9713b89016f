import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { OLD_AFTER_DAYS, type Certainty, type ConversionClass } from '@/lib/core/demand/conversion'
import { sequelize } from '@/lib/db/sequelize'
import type { Run } from '@/models'
import type { OfferKind, OutcomeClass } from '@/models/words'
import type { RunFacts } from './run-facts'
import { partOfWindow } from './window-of'

export const CLASS_OF_OUTCOME: Readonly<Record<OutcomeClass, ConversionClass>> = {
  certain: 'certain',
  likely: 'likely',
  curious: 'curious',
  old_signup: 'oldSignUp',
  deposit_paying: 'depositHolder',
}

type Row = {
  quantity: number
  offer: OfferKind
  certainty: Certainty
  confirmedAt: Date
  invitedAt: Date | null
  answer: 'ordered' | 'declined' | 'silent'
}

/**
 * The confirmed sign-ups of a run's module with what each has answered, and what earlier runs of the workshop taught about
 * such people; two statements. Somebody whose hold ended unpaid is silent: they may come back. Somebody who gave a place
 * back has declined.
 */
export async function readDemand(
  run: Run,
  now: Date,
  tx: Transaction | null,
): Promise<Pick<RunFacts, 'signUps' | 'outcomes'>> {
  const rows = await sequelize.query<Row>(
    `select s.quantity, f.kind as offer, s.certainty, s.confirmed_at as "confirmedAt", i.sent_at as "invitedAt",
            case when o.placed then 'ordered' when o.ended or i.state = 'declined' then 'declined' else 'silent' end as answer
     from signups s join offers f on f.id = s.offer_id
     left join invitations i on i.run_id = $runId and i.signup_id = s.id
     left join (select person_id,
                       bool_or(state not in ('expired', 'cancelled', 'lapsed', 'withdrawn', 'returned')) as placed,
                       bool_or(state in ('cancelled', 'lapsed', 'withdrawn', 'returned')) as ended
                from orders where run_id = $runId group by 1) o on o.person_id = s.person_id
     where s.module_id = $moduleId and s.state = 'confirmed' order by s.confirmed_at, s.id`,
    { bind: { runId: run.id, moduleId: run.moduleId }, type: QueryTypes.SELECT, transaction: tx },
  )
  const outcomes = await sequelize.query<{
    className: OutcomeClass
    converted: number
    notConverted: number
  }>(
    `select class_name as "className", sum(converted)::int as converted, sum(not_converted)::int as "notConverted"
     from outcomes where workshop_id = $workshopId and run_id <> $runId group by 1`,
    { bind: { workshopId: run.workshopId, runId: run.id }, type: QueryTypes.SELECT, transaction: tx },
  )
  const classified = rows.map((row) => ({ ...row, certainty: classOf(row, now) }))
  return {
    signUps: {
      confirmed: rows.length,
      notOrdered: classified
        .filter(({ answer }) => answer === 'silent')
        .map(({ quantity, offer, certainty, invitedAt }) => ({
          quantity,
          offer,
          certainty,
          invitedAt: invitedAt && partOfWindow(run, invitedAt),
        })),
      answered: countAnswers(classified),
    },
    outcomes: outcomes.map((each) => ({ ...each, className: CLASS_OF_OUTCOME[each.className] })),
  }
}

/** A sign-up is as old as it was when it was invited: waiting since then is silence, which counts by itself. */
function classOf({ certainty, confirmedAt, invitedAt }: Row, now: Date): ConversionClass {
  const age = (invitedAt ?? now).getTime() - confirmedAt.getTime()
  return age > OLD_AFTER_DAYS * 86_400_000 ? 'oldSignUp' : certainty
}

function countAnswers(rows: readonly { certainty: ConversionClass; answer: Row['answer'] }[]) {
  const counts = new Map<ConversionClass, { ordered: number; declined: number }>()
  for (const { certainty, answer } of rows) {
    if (answer === 'silent') continue
    const count = counts.get(certainty) ?? { ordered: 0, declined: 0 }
    counts.set(certainty, { ...count, [answer]: count[answer] + 1 })
  }
  return [...counts].map(([certainty, count]) => ({ certainty, ...count }))
}
