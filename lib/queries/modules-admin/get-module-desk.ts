import 'server-only'
import { QueryTypes } from 'sequelize'
import type { LessonDesk, ModuleDesk, OfferDesk, RevisionDesk } from '@/lib/contracts/module-desk'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { Module, Offer, Plan } from '@/models'

type Asked = { actor: Actor; workshopId: string; module: string }

/** A module with everything its owner keeps about it; null when there is none to see. Six queries, whatever its size. */
export async function getModuleDesk({ actor, workshopId, module: slug }: Asked): Promise<ModuleDesk | null> {
  if (!can(actor, 'module:read', { workshopId })) return null
  const module = await Module.findOne({ where: { workshopId, slug } })
  if (!module) return null
  const moduleId = module.id
  const given = { replacements: { moduleId }, type: QueryTypes.SELECT as const }
  const offers = await Offer.findAll({ where: { moduleId }, order: [['position', 'ASC']] })
  const reached = await sequelize.query<{ id: string; open: number }>(OPEN, given)
  const open = new Map(reached.map((row) => [row.id, row.open]))
  return {
    module: factsOf(module),
    offers: offers.map((offer) => toOffer(offer, open.get(offer.id) ?? 0)),
    revisions: (await sequelize.query<RevisionRow>(REVISIONS, given)).map(toRevision),
    lessons: await sequelize.query<LessonDesk>(LESSONS, given),
    hasPlan: (await Plan.count({ where: { moduleId, runId: null, isBase: true } })) > 0,
  }
}

type RevisionRow = Pick<RevisionDesk, 'letter' | 'state' | 'note' | 'parts'> & {
  createdAt: Date
  at: Date | null
  how: string | null
  by: string | null
}

const OPEN = `
  select d.offer_id as id, count(*)::int as open from destinations d join offers o on o.id = d.offer_id
  where o.module_id = :moduleId and d.state = 'open' group by d.offer_id`

const REVISIONS = `
  select r.letter, r.state, r.note, r.created_at as "createdAt", r.first_good_at as at, r.first_good_how as how,
         coalesce(p.name, p.email_shown) as by,
         (select count(*) from revision_lines l where l.revision_id = r.id)::int as parts
  from revisions r left join people p on p.id = r.first_good_by_person_id
  where r.module_id = :moduleId order by length(r.letter) desc, r.letter desc`

const LESSONS = `
  select l.id, f.letter as "foundOn", l.symptom, l.how_found as "howFound", l.cause, l.remedy,
         m.letter as "mendedIn", l.waived_reason as "waivedReason"
  from lessons l join revisions f on f.id = l.found_on_revision_id
  left join revisions m on m.id = l.mended_in_revision_id
  where l.module_id = :moduleId order by l.created_at desc, l.id`

function factsOf(module: Module): ModuleDesk['module'] {
  const { slug, name, oneLine, story, state, widthHp, depthMm, plus12Ma, minus12Ma, plus5Ma } = module
  const { controls, specification, cautions, videoUrl, hideInterestBelowTen } = module
  const words = { slug, name, oneLine, story, state, cautions, videoUrl, hideInterestBelowTen }
  return { ...words, widthHp, depthMm, plus12Ma, minus12Ma, plus5Ma, controls, specification }
}

function toOffer(offer: Offer, destinations: number): OfferDesk {
  const { kind, priceMinor, depositMinor, priceListMinor, taxClass, contents, cautions, ageFrom } = offer
  const { netWeightG, packedWeightG, lengthMm, widthMm, heightMm } = offer
  const { customsDescription, customsCode, customsOrigin, storagePlace } = offer
  return {
    ...{ offer: kind, priceMinor, depositMinor, priceListMinor, taxClass, contents, cautions, ageFrom },
    ...{ netWeightG, packedWeightG, lengthMm, widthMm, heightMm },
    ...{ customsDescription, customsCode, customsOrigin, storagePlace },
    withdrawn: offer.withdrawnAt !== null,
    destinations,
  }
}

function toRevision({ at, how, by, createdAt, ...row }: RevisionRow): RevisionDesk {
  return {
    ...row,
    createdAt: createdAt.toISOString(),
    firstGood: at && { at: at.toISOString(), how: how ?? '', by },
  }
}
