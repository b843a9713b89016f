import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { OfferFacts } from './run-facts'

/** A run's offers with what the post must know about each; one statement. */
export async function readOffers(runId: string, tx: Transaction | null): Promise<OfferFacts[]> {
  return sequelize.query<OfferFacts>(
    `select r.kind, r.price_minor as "priceMinor", r.deposit_minor as "depositMinor",
            r.posted_by_on::text as "postedByOn",
            o.net_weight_g is not null and o.packed_weight_g is not null as "hasWeight",
            o.customs_code <> '' as "hasCustomsCode", o.customs_origin is not null as "hasOrigin",
            btrim(o.cautions) <> '' as "hasCautions",
            (select count(*)::int from destinations d where d.offer_id = o.id and d.state = 'open') as "openDestinations"
     from run_offers r join offers o on o.id = r.offer_id
     where r.run_id = $runId order by o.position, r.kind`,
    { bind: { runId }, type: QueryTypes.SELECT, transaction: tx },
  )
}
