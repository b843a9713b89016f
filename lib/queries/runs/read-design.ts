import 'server-only'
import { QueryTypes, type Transaction } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { Run } from '@/models'
import type { RunFacts, PartLine, QuoteFacts } from './run-facts'

type Design = Pick<RunFacts, 'firstUnits' | 'built' | 'openLessons' | 'lines' | 'quotes'>

type LessonRow = { foundOn: string; mendedIn: string | null; isWaived: boolean }

/** What the bench and the parts list know of a run's revision; four statements. */
export async function readDesign(run: Run, letter: string, tx: Transaction | null): Promise<Design> {
  const bind = { revisionId: run.revisionId, moduleId: run.moduleId }
  const how = { type: QueryTypes.SELECT, transaction: tx } as const
  const [units] = await sequelize.query<{
    tried: number
    good: number
    passed: number
    scrapped: number
  }>(
    `select count(*) filter (where u.run_id is null and u.revision_id = $revisionId)::int as tried,
            count(*) filter (where u.run_id is null and u.revision_id = $revisionId and u.passed_at is not null)::int as good,
            count(*) filter (where u.run_id is not null and u.state in ('passed', 'allocated', 'posted'))::int as passed,
            count(*) filter (where u.run_id is not null and u.state = 'scrapped')::int as scrapped
     from units u join revisions r on r.id = u.revision_id where r.module_id = $moduleId`,
    { bind, ...how },
  )
  const lessons = await sequelize.query<LessonRow>(
    `select f.letter as "foundOn", m.letter as "mendedIn", l.waived_at is not null as "isWaived"
     from lessons l join revisions f on f.id = l.found_on_revision_id
     left join revisions m on m.id = l.mended_in_revision_id where l.module_id = $moduleId`,
    { bind: { moduleId: run.moduleId }, ...how },
  )
  const lines = await readLines(run.revisionId, tx)
  const { tried = 0, good = 0, passed = 0, scrapped = 0 } = units ?? {}
  return {
    firstUnits: { tried, good },
    built: { passed, scrapped },
    openLessons: lessons.filter((lesson) => isOpen(lesson, letter)).length,
    lines,
    quotes: await readQuotes(
      lines.map(({ partId }) => partId),
      tx,
    ),
  }
}

/** A lesson of an earlier revision that neither this one nor one between them mends, and nobody waived. */
function isOpen({ foundOn, mendedIn, isWaived }: LessonRow, letter: string): boolean {
  if (isWaived || !isEarlier(foundOn, letter)) return false
  return mendedIn === null || isEarlier(letter, mendedIn)
}

/** A before B, Z before AA. */
const isEarlier = (one: string, other: string) =>
  one.length === other.length ? one < other : one.length < other.length

type LineRow = Omit<PartLine, 'neededFor' | 'attrition' | 'quotes'> & {
  placedBy: Record<string, string>
  basisPoints: number
  atLeast: number
  quotes: number
}

async function readLines(revisionId: string, tx: Transaction | null): Promise<PartLine[]> {
  const rows = await sequelize.query<LineRow>(
    `select l.id, l.part_id as "partId", l.designators, l.per_unit as "perUnit", l.per_unit as quantity,
            l.placed_by as "placedBy", l.attrition_basis_points as "basisPoints", l.attrition_at_least as "atLeast",
            l.supply_pins as "supplyPins", p.value, p.description, p.lifecycle, p.polarity_note as "polarityNote",
            p.needs_sample as "needsSample",
            p.sample_checked_on is not null and coalesce(p.sample_fits, false) as "sampleFits",
            (select count(*)::int from quotes q where q.part_id = p.id) as quotes,
            (select count(*)::int from part_alternates a where a.part_id = p.id) as alternates,
            coalesce((select sum(s.change) from stock_moves s where s.part_id = p.id), 0)::int as "onHand"
     from revision_lines l join parts p on p.id = l.part_id
     where l.revision_id = $revisionId order by l.position`,
    { bind: { revisionId }, type: QueryTypes.SELECT, transaction: tx },
  )
  return rows.map(({ placedBy, basisPoints, atLeast, ...row }) => ({
    ...row,
    neededFor: Object.keys(placedBy),
    attrition: { basisPoints, atLeast },
  }))
}

async function readQuotes(partIds: string[], tx: Transaction | null): Promise<QuoteFacts[]> {
  if (partIds.length === 0) return []
  return sequelize.query<QuoteFacts>(
    `select q.part_id as "partId", q.quoted_on::text as "quotedOn", q.stock_seen as "stockSeen",
            q.stock_seen_on::text as "stockSeenOn", q.moq, q.multiple,
            coalesce(json_agg(json_build_object('from', b.from_quantity, 'unitPrice', b.unit_price::text)
                              order by b.from_quantity) filter (where b.id is not null), '[]') as breaks
     from quotes q left join quote_breaks b on b.quote_id = q.id
     where q.part_id in (:partIds) group by q.id`,
    { replacements: { partIds }, type: QueryTypes.SELECT, transaction: tx },
  )
}
