/**
 * SQL: the parcels that can be packed now, with their order, address, run and module. `p` parcel, `o` order, `a` address,
 * `pl` and `ol` lines, `ro` run offer, `r` run, `m` module. Binds $workshopId.
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
  where p.workshop_id = $workshopId and p.state = 'open' and p.problem_id is null and p.on_hold_reason is null
    and o.state = 'paid' and o.disputed_at is null
    and not exists (select from order_lines ol2 join run_offers ro2 on ro2.id = ol2.run_offer_id
                    join destinations d on d.offer_id = ro2.offer_id
                    join parcel_lines pl2 on pl2.order_line_id = ol2.id
                    where pl2.parcel_id = p.id and d.country = o.country and d.state = 'paused')`

/** SQL: the promise of a parcel, the earliest of its lines. */
export const PROMISE = 'min(coalesce(ol.revised_posted_by_on, ol.posted_by_on))'

/** SQL: the addressee as whoever packs can read it: in Latin letters where they were given. */
export const ADDRESSEE = "coalesce(nullif(a.latin ->> 'name', ''), a.name)"
