import 'server-only'
import { Op, QueryTypes } from 'sequelize'
import type { PostageZoneView, SettingsView, TaxRateView } from '@/lib/contracts/settings'
import { can, type Actor } from '@/lib/core/policy/can'
import { dayIn } from '@/lib/core/time/zone'
import { sequelize } from '@/lib/db/sequelize'
import { PostageService, PostageZone, TaxRate, TermsVersion, Workshop } from '@/models'

/** A workshop's settings; null when the actor may not see them. Six queries, whatever there is. */
export async function getSettings(cmd: {
  actor: Actor
  workshopId: string
  now: Date
}): Promise<SettingsView | null> {
  const { actor, workshopId } = cmd
  if (!can(actor, 'settings:read', { workshopId })) return null
  const workshop = await Workshop.findByPk(workshopId)
  if (!workshop) return null
  const zones = await PostageZone.findAll({
    where: { workshopId },
    include: [{ model: PostageService, as: 'services', required: false, where: { endedAt: null } }],
    order: [['position', 'ASC']],
  })
  const terms = await TermsVersion.findOne({ where: { workshopId }, order: [['number', 'DESC']] })
  return {
    details: detailsOf(workshop),
    homeRate: await homeRate(workshop, cmd.now),
    zones: zones.map(toZone),
    terms: terms && {
      number: terms.number,
      body: terms.body,
      lapseKeepsDeposit: terms.lapseKeepsDeposit,
      publishedAt: terms.publishedAt.toISOString(),
    },
    closedDestinations: await sequelize.query(CLOSED, {
      replacements: { workshopId },
      type: QueryTypes.SELECT,
    }),
  }
}

const CLOSED = `
  select m.name as module, o.kind as offer, d.country, d.state, coalesce(d.reason, '') as reason
  from destinations d join offers o on o.id = d.offer_id join modules m on m.id = o.module_id
  where d.workshop_id = :workshopId and d.state <> 'open' order by d.country, m.name, o.position limit 500`

function detailsOf(workshop: Workshop): SettingsView['details'] {
  const { name, legalName, replyTo, phone, about, taxMode, pricesIncludeTax, taxNumber, taxNote } = workshop
  const { depositsTaxed, headStartHours, limitPerPerson, lapseAfterDays, postalAddress } = workshop
  return {
    ...{ name, legalName: legalName ?? '', replyTo: replyTo ?? '', phone, about },
    ...{
      taxMode,
      pricesIncludeTax,
      depositsTaxed,
      taxNumber,
      taxNote,
      headStartHours,
      limitPerPerson,
      lapseAfterDays,
    },
    postalAddress: postalAddress && { ...postalAddress, lines: [...postalAddress.lines], latin: undefined },
  }
}

async function homeRate({ id, country, timeZone }: Workshop, now: Date): Promise<TaxRateView | null> {
  const row = await TaxRate.findOne({
    where: {
      country,
      taxClass: 'standard',
      workshopId: { [Op.or]: [null, id] },
      validFrom: { [Op.lte]: dayIn(now, timeZone) },
    },
    order: [
      ['workshopId', 'ASC NULLS LAST'],
      ['validFrom', 'DESC'],
    ],
  })
  return row && { country, basisPoints: row.basisPoints, validFrom: row.validFrom, source: row.source }
}

function toZone({ id, name, countries, services = [] }: PostageZone): PostageZoneView {
  const sorted = [...services].sort((a, b) => a.position - b.position)
  return {
    ...{ id, name, countries },
    services: sorted.map((service) => ({
      name: service.name,
      kind: service.kind,
      maxGrams: service.maxGrams,
      maxMm: service.maxMm,
      tracked: service.tracked,
      bands: service.bands.map(({ upTo, priceMinor }) => ({ upTo, priceMinor })),
    })),
  }
}
