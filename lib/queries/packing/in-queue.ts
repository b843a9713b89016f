import type { QueueQuery } from '@/lib/contracts/packing'

/**
 * SQL: the parcels that can be packed now, with their order, address, run and module. `p` parcel, `o` order, `a` address,
 * `pl` and `ol` lines, `ro` run offer, `r` run, `m` module, `b` the open batch it is in. Binds $workshopId.
 */
export const QUEUE_FROM = `
  parcels p
  join addresses a on a.id = p.address_id
  join parcel_lines pl on pl.parcel_id = p.id
  join order_lines ol on ol.id = pl.order_line_id
  join run_offers ro on ro.id = ol.run_offer_id
  join orders o on o.id = ol.order_id
  join runs r on r.id = o.run_id
  join modules m on m.id = r.module_id
  left join pack_batches b on b.id = p.batch_id and b.closed_at is null
  where p.workshop_id = $workshopId and p.state = 'open' and p.on_hold_reason is null
    and (o.state = 'paid' or (p.problem_id is not null and o.state = 'posted')) and o.disputed_at is null
    and not exists (select from order_lines ol2 join run_offers ro2 on ro2.id = ol2.run_offer_id
                    join destinations d on d.offer_id = ro2.offer_id
                    join parcel_lines pl2 on pl2.order_line_id = ol2.id
                    where pl2.parcel_id = p.id and d.country = o.country and d.state = 'paused')`

/** SQL: the promise of a parcel, the earliest of its lines. */
export const PROMISE = 'min(coalesce(ol.revised_posted_by_on, ol.posted_by_on))'

/** SQL: the addressee as whoever packs can read it: in Latin letters where they were given. */
export const ADDRESSEE = "coalesce(nullif(a.latin ->> 'name', ''), a.name)"

/** SQL: equal for parcels of the same contents. */
export const GROUP =
  "md5(string_agg(concat_ws('|', m.id, ol.offer_kind, pl.quantity, ol.choices), '+' order by m.id, ol.offer_kind, ol.choices::text))"

/** SQL: lines of a parcel as a packer sees them, as json. */
export const LINES = `json_agg(json_build_object('line', ol.id, 'module', m.name, 'offer', ol.offer_kind,
  'quantity', pl.quantity, 'choices', ol.choices) order by ol.position)`

/** SQL: what of the queue is asked for, before parcels are put together. Binds as of `queueBind`. */
export const QUEUE_WHERE = `
  ($country::text is null or a.country = $country)
  and ($service::text is null or o.postage_quote ->> 'serviceName' = $service)
  and ($batch::uuid is null or p.batch_id = $batch)`

/** SQL: the same, of a parcel as a whole. */
export const QUEUE_HAVING = `
  ($offer::text is null or bool_or(ol.offer_kind = $offer))
  and ($choice::text is null or bool_or(exists (
    select from jsonb_array_elements(ol.choices) c where concat(c ->> 'question', ': ', c ->> 'label') = $choice)))
  and ($group::text is null or ${GROUP} = $group)`

/** The values that `QUEUE_WHERE` and `QUEUE_HAVING` bind. */
export function queueBind(query: Omit<QueueQuery, 'after'>) {
  const { offer, country, choice, service, group, batch } = query
  return {
    offer: offer ?? null,
    country: country ?? null,
    choice: choice ?? null,
    service: service ?? null,
    group: group ?? null,
    batch: batch ?? null,
  }
}
