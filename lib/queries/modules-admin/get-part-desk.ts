import 'server-only'
import { QueryTypes } from 'sequelize'
import type { PartDesk } from '@/lib/contracts/part-forms'
import { can, type Actor } from '@/lib/core/policy/can'
import { daysBetween } from '@/lib/core/time/day'
import { sequelize } from '@/lib/db/sequelize'
import { Module, Part, Quote, QuoteBreak } from '@/models'

type Asked = { actor: Actor; workshopId: string; module: string; part: string; today: string }

/** One part of a module with its quotes, newest first; null when there is none to see. Five queries. */
export async function getPartDesk(cmd: Asked): Promise<PartDesk | null> {
  const { actor, workshopId, today } = cmd
  if (!can(actor, 'part:read', { workshopId })) return null
  const module = await Module.findOne({ where: { workshopId, slug: cmd.module }, attributes: ['id'] })
  const part = await Part.findOne({ where: { workshopId, id: cmd.part } })
  if (!module || !part) return null
  const bind = { partId: part.id, moduleId: module.id }
  const quotes = await Quote.findAll({
    where: { partId: part.id },
    order: [
      ['quotedOn', 'DESC'],
      ['supplier', 'ASC'],
    ],
    include: [{ model: QuoteBreak, as: 'breaks' }],
  })
  const alternates = await sequelize.query<PartDesk['alternates'][number]>(ALTERNATES, {
    bind: { partId: part.id },
    type: QueryTypes.SELECT,
  })
  const used = await sequelize.query<PartDesk['usedIn'][number] & { onHand: number }>(USED, {
    bind,
    type: QueryTypes.SELECT,
  })
  return {
    id: part.id,
    code: part.code,
    value: part.value,
    description: part.description,
    lifecycle: part.lifecycle,
    onHand: used[0]?.onHand ?? 0,
    quotes: quotes.map((quote) => viewOf(quote, today)),
    alternates,
    usedIn: used.filter(({ letter }) => letter !== '').map(({ onHand: _, ...use }) => use),
    sample: sampleOf(part),
  }
}

const ALTERNATES = `
  select p.id, p.code, p.value, a.note,
         coalesce((select sum(s.change) from stock_moves s where s.part_id = p.id), 0)::int as "onHand"
  from part_alternates a join parts p on p.id = a.alternate_id where a.part_id = $partId order by p.code`

/** One row at least, so that the stock is known of a part that no list uses. */
const USED = `
  select coalesce(r.letter, '') as letter, coalesce(l.per_unit, 0) as "perUnit",
         coalesce(l.placed_by, '{}') as "placedBy",
         (select coalesce(sum(s.change), 0)::int from stock_moves s where s.part_id = $partId) as "onHand"
  from (select 1) one left join (revision_lines l join revisions r
    on r.id = l.revision_id and r.module_id = $moduleId) on l.part_id = $partId
  order by length(r.letter) desc, r.letter desc`

function viewOf(quote: Quote, today: string): PartDesk['quotes'][number] {
  const breaks = (quote.breaks ?? []).map(({ fromQuantity, unitPrice }) => ({
    from: fromQuantity,
    unitPrice,
  }))
  return {
    id: quote.id,
    supplier: quote.supplier,
    supplierCode: quote.supplierCode,
    currency: quote.currency,
    quotedOn: quote.quotedOn,
    ageDays: Math.max(0, daysBetween(quote.quotedOn, today)),
    moq: quote.moq,
    multiple: quote.multiple,
    setupMinor: quote.setupMinor,
    breaks: breaks.sort((a, b) => a.from - b.from),
    leadDays: quote.leadDays,
    stockSeen: quote.stockSeen,
    stockSeenOn: quote.stockSeenOn,
  }
}

function sampleOf(part: Part): PartDesk['sample'] {
  const checked = part.sampleFits === null ? 'open' : part.sampleFits ? 'fits' : 'does_not_fit'
  return {
    state: part.needsSample ? checked : 'not_needed',
    on: part.sampleCheckedOn,
    note: part.sampleNote,
  }
}
