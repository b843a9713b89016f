import 'server-only'
import type { CostPlan } from '@/lib/core/costs/plan'
import { Part, Quote, RevisionLine } from '@/models'
import type { PartLine } from './run-facts'

/** The newest quote of each supplier decides; its day is what changes when somebody asks again. */
type Seen = { perUnit: number; onHand: number; suppliers: string }

/**
 * In how many lines a revision's parts list differs from the one a plan was saved with: lines come or gone, pieces, stock
 * or suppliers that are others now. One statement.
 */
export async function countChangedParts(
  revisionId: string,
  plan: CostPlan,
  lines: readonly PartLine[],
): Promise<number> {
  const rows = await RevisionLine.findAll({
    where: { revisionId },
    attributes: ['id', 'perUnit'],
    include: [
      {
        model: Part,
        as: 'part',
        attributes: ['code'],
        required: true,
        include: [{ model: Quote, as: 'quotes', attributes: ['supplier'], required: false }],
      },
    ],
  })
  const stock = new Map(lines.map(({ id, onHand }) => [id, Math.max(0, onHand)]))
  const suppliers = (names: readonly string[]) => [...new Set(names)].sort().join('\n')
  const current = new Map(
    rows.map((row): [string, Seen] => [
      row.part!.code,
      {
        perUnit: row.perUnit,
        onHand: stock.get(row.id) ?? 0,
        suppliers: suppliers((row.part!.quotes ?? []).map(({ supplier }) => supplier)),
      },
    ]),
  )
  const kept = new Map(
    plan.parts.map((part): [string, Seen] => [
      part.name ?? part.id,
      {
        perUnit: part.perUnit,
        onHand: part.onHand,
        suppliers: suppliers(part.quotes.map(({ supplier }) => supplier)),
      },
    ]),
  )
  const codes = new Set([...current.keys(), ...kept.keys()])
  return [...codes].filter((code) => JSON.stringify(current.get(code)) !== JSON.stringify(kept.get(code)))
    .length
}
