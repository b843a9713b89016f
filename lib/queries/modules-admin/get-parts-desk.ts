import 'server-only'
import { stringify } from 'csv-stringify/sync'
import { QueryTypes } from 'sequelize'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { PART_HEADINGS } from '@/lib/contracts/parts-list'
import { writeBreaks } from '@/lib/contracts/price-breaks'
import { plainMoney } from '@/lib/core/money/plain'
import { lintParts } from '@/lib/core/parts/lint'
import { writeShare } from '@/lib/core/plain/share'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { ChoiceAnswer, Module, Part, Quote, QuoteBreak, Revision, RevisionLine } from '@/models'

/** Lines on one page. */
const PAGE = 200

type Asked = {
  actor: Actor
  workshopId: string
  module: string
  revision?: string | undefined
  from?: number | undefined
}

/**
 * The parts list of a revision (the newest unless named) with its check and as it would be pasted; null when there is
 * nothing to see. A bounded number of queries.
 */
export async function getPartsDesk(cmd: Asked): Promise<PartsDesk | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'part:read', { workshopId })) return null
  const module = await Module.findOne({ where: { workshopId, slug: cmd.module }, attributes: ['id'] })
  if (!module) return null
  const revisions = await Revision.findAll({ where: { moduleId: module.id } })
  revisions.sort((a, b) => b.letter.length - a.letter.length || b.letter.localeCompare(a.letter))
  const shown = revisions.find(({ letter }) => letter === cmd.revision) ?? revisions[0]
  const lines = shown ? await linesOf(shown.id) : []
  const stock = await stockOf(lines.map(({ partId }) => partId))
  const from = Math.max(0, cmd.from ?? 0)
  const all = lines.map((line) => toLine(line, stock.get(line.partId) ?? 0))
  const alternates = await alternatesOf(lines.map(({ partId }) => partId))
  return {
    revisions: revisions.map(({ letter }) => letter),
    revision: shown?.letter ?? null,
    csv: csvOf(lines, await labelsOf(lines), alternates),
    lines: all.slice(from, from + PAGE),
    from,
    next: from + PAGE < all.length ? from + PAGE : null,
    samples: all
      .filter(({ sample }) => sample !== 'not_needed')
      .map(({ partId, code, sample }) => ({ partId, code, sample })),
    findings: findingsOf(lines, alternates),
  }
}

const linesOf = (revisionId: string) =>
  RevisionLine.findAll({
    where: { revisionId },
    include: [
      {
        model: Part,
        as: 'part',
        required: true,
        include: [
          {
            model: Quote,
            as: 'quotes',
            separate: true,
            order: [['quotedOn', 'DESC']],
            include: [{ model: QuoteBreak, as: 'breaks' }],
          },
        ],
      },
    ],
    order: [['position', 'ASC']],
  })

function toLine(line: RevisionLine, onHand: number): PartsDesk['lines'][number] {
  const part = line.part!
  const quote = part.quotes?.[0]
  const checked = part.sampleFits === null ? 'open' : part.sampleFits ? 'fits' : 'does_not_fit'
  return {
    id: line.id,
    partId: part.id,
    code: part.code,
    value: part.value,
    designators: line.designators,
    perUnit: line.perUnit,
    placedBy: line.placedBy,
    onHand,
    quotedOn: quote?.quotedOn ?? null,
    stockSeenOn: quote?.stockSeenOn ?? null,
    sample: part.needsSample ? checked : 'not_needed',
  }
}

async function stockOf(partIds: string[]): Promise<Map<string, number>> {
  if (partIds.length === 0) return new Map()
  const rows = await sequelize.query<{ id: string; count: number }>(
    'select part_id as id, sum(change)::int as count from stock_moves where part_id in (:partIds) group by part_id',
    { replacements: { partIds }, type: QueryTypes.SELECT },
  )
  return new Map(rows.map(({ id, count }) => [id, count]))
}

/** What may stand in for some parts, by their codes. */
async function alternatesOf(partIds: string[]): Promise<Map<string, string[]>> {
  const found = new Map<string, string[]>()
  if (partIds.length === 0) return found
  const rows = await sequelize.query<{ id: string; code: string }>(
    `select a.part_id as id, p.code from part_alternates a join parts p on p.id = a.alternate_id
     where a.part_id in (:partIds) order by p.code`,
    { replacements: { partIds }, type: QueryTypes.SELECT },
  )
  for (const { id, code } of rows) found.set(id, [...(found.get(id) ?? []), code])
  return found
}

/** The answers some lines are for, by their labels. */
async function labelsOf(lines: readonly RevisionLine[]): Promise<Map<string, string>> {
  const ids = lines.flatMap(({ choiceAnswerId }) => choiceAnswerId ?? [])
  const answers = await ChoiceAnswer.findAll({ where: { id: ids }, attributes: ['id', 'label'] })
  return new Map(answers.map(({ id, label }) => [id, label]))
}

function findingsOf(
  lines: readonly RevisionLine[],
  alternates: ReadonlyMap<string, string[]>,
): PartsDesk['findings'] {
  const found = lintParts(
    lines.map((line) => ({
      id: line.id,
      designators: line.designators,
      quantity: line.perUnit,
      value: line.part!.value,
      description: line.part!.description,
      neededFor: Object.keys(line.placedBy),
      quotes: line.part!.quotes?.length ?? 0,
      alternates: alternates.get(line.partId)?.length ?? 0,
      lifecycle: line.part!.lifecycle,
      supplyPins: line.supplyPins,
      polarityNote: line.part!.polarityNote,
    })),
  )
  const codeOf = new Map(lines.map(({ id, part }) => [id, part!.code]))
  return found.map(({ line, ...rest }) => ({
    code: line === null ? null : (codeOf.get(line) ?? null),
    ...rest,
  }))
}

function csvOf(
  lines: readonly RevisionLine[],
  labels: ReadonlyMap<string, string>,
  alternates: ReadonlyMap<string, string[]>,
): string {
  const rows = lines.map((line) => {
    const part = line.part!
    const quote = part.quotes?.[0]
    const cells: Record<(typeof PART_HEADINGS)[number], string | number> = {
      code: part.code,
      description: part.description,
      value: part.value,
      designators: line.designators,
      per_unit: line.perUnit,
      boards: line.placedBy.boards ?? '',
      kit: line.placedBy.kit ?? '',
      built: line.placedBy.built ?? '',
      attrition_percent: writeShare(line.attritionBasisPoints),
      attrition_least: line.attritionAtLeast,
      needs_sample: part.needsSample ? 'yes' : 'no',
      lifecycle: part.lifecycle,
      supply_pins: line.supplyPins,
      polarity: part.polarityNote,
      supplier: quote?.supplier ?? '',
      currency: quote?.currency ?? '',
      moq: quote?.moq ?? '',
      multiple: quote?.multiple ?? '',
      setup: quote && quote.setupMinor > 0 ? plainMoney(quote.setupMinor, quote.currency) : '',
      breaks: quote ? breaksOf(quote) : '',
      lead_days: quote?.leadDays ?? '',
      quoted_on: quote?.quotedOn ?? '',
      stock_seen: quote?.stockSeen ?? '',
      stock_seen_on: quote?.stockSeenOn ?? '',
      choice: line.choiceAnswerId === null ? '' : (labels.get(line.choiceAnswerId) ?? ''),
      alternates: (alternates.get(line.partId) ?? []).join('; '),
    }
    return cells
  })
  return stringify(rows, { header: true, columns: [...PART_HEADINGS] })
}

function breaksOf({ breaks = [], currency }: Quote): string {
  const sorted = [...breaks].sort((a, b) => a.fromQuantity - b.fromQuantity)
  return writeBreaks(
    sorted.map(({ fromQuantity, unitPrice }) => ({ from: fromQuantity, unitPrice })),
    currency,
  )
}
