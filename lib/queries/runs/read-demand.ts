import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { OLD_AFTER_DAYS, type Certainty, type ConversionClass } from '@/lib/core/demand/conversion'
import { sequelize } from '@/lib/db/sequelize'
import type { Run } from '@/models'
import type { OfferKind, OutcomeClass } from '@/models/words'
import type { RunFacts } from './run-facts'

const CLASSES: Readonly<Record<OutcomeClass, ConversionClass>> = {
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
  hasOrdered: boolean
}

/**
 * The confirmed sign-ups of a run's module, and what earlier runs of the workshop taught about such people; two
 * statements. Somebody whose hold ended unpaid has not ordered: they may come back.
 */
export async function readDemand(
  run: Run,
  now: Date,
  tx: Transaction | null,
): Promise<Pick<RunFacts, 'signUps' | 'outcomes'>> {
  const rows = await sequelize.query<Row>(
    `select s.quantity, f.kind as offer, s.certainty, s.confirmed_at as "confirmedAt",
            exists (select 1 from orders o where o.run_id = $runId and o.person_id = s.person_id
                    and o.state <> 'expired') as "hasOrdered"
     from signups s join offers f on f.id = s.offer_id
     where s.module_id = $moduleId and s.state = 'confirmed'`,
    { bind: { runId: run.id, moduleId: run.moduleId }, type: QueryTypes.SELECT, transaction: tx },
  )
  const oldBefore = now.getTime() - OLD_AFTER_DAYS * 86_400_000
  const outcomes = await sequelize.query<{
    className: OutcomeClass
    converted: number
    notConverted: number
  }>(
    `select class_name as "className", sum(converted)::int as converted, sum(not_converted)::int as "notConverted"
     from outcomes where workshop_id = $workshopId and run_id <> $runId group by 1`,
    { bind: { workshopId: run.workshopId, runId: run.id }, type: QueryTypes.SELECT, transaction: tx },
  )
  return {
    signUps: {
      confirmed: rows.length,
      notOrdered: rows
        .filter(({ hasOrdered }) => !hasOrdered)
        .map(({ quantity, offer, certainty, confirmedAt }) => ({
          quantity,
          offer,
          certainty: confirmedAt.getTime() < oldBefore ? 'oldSignUp' : certainty,
        })),
    },
    outcomes: outcomes.map((each) => ({ ...each, className: CLASSES[each.className] })),
  }
}
