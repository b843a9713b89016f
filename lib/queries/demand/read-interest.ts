import 'server-only'
import { QueryTypes } from 'sequelize'
import type { Day } from '@/lib/core/brand'
import type { Certainty } from '@/lib/core/demand/conversion'
import { sequelize } from '@/lib/db/sequelize'
import type { OfferKind } from '@/models/words'

/** Sign-ups that gave the same answers on the same day, counted. */
export type InterestRow = {
  day: Day
  offer: OfferKind
  country: string
  certainty: Certainty
  topPrice: number | null
  people: number
  units: number
}

/** Confirmed sign-ups of a module, counted by day and answers; days are the workshop's own. One statement, no names. */
export function readInterest(moduleId: string, timeZone: string): Promise<InterestRow[]> {
  return sequelize.query<InterestRow>(
    `select (s.confirmed_at at time zone $timeZone)::date::text as day, f.kind as offer, s.country, s.certainty,
            s.top_price_minor as "topPrice", count(*)::int as people, sum(s.quantity)::int as units
     from signups s join offers f on f.id = s.offer_id
     where s.module_id = $moduleId and s.state = 'confirmed'
     group by 1, 2, 3, 4, 5 order by 1`,
    { bind: { moduleId, timeZone }, type: QueryTypes.SELECT },
  )
}
