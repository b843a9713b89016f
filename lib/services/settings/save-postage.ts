import 'server-only'
import type { Transaction } from 'sequelize'
import { refuseFields } from '@/lib/contracts/problem'
import type { PostageInput } from '@/lib/contracts/settings'
import { minor } from '@/lib/core/brand'
import { EU_MEMBERS } from '@/lib/core/data/eu-members'
import { toProvider } from '@/lib/core/money/provider'
import { can, type Actor } from '@/lib/core/policy/can'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { settingsWords as words } from '@/lib/messages/settings'
import { PostageService, PostageZone, Workshop } from '@/models'
import { openDestinations } from '../_steps/open-destinations'
import { workshopPagesChanged } from '../_steps/workshop-pages-changed'

/**
 * Adds a zone of the post with its services, or changes one. Services are never overwritten, since parcels name them: the
 * old ones end and the new ones take their place. Every country of the zone is opened for offers that say nothing of it.
 * Refuses: not_found · forbidden · invalid (a country in two zones; a price the provider cannot charge). Locks: the
 * workshop. Writes: zone, services, destinations; public pages are made anew. Repeat: changing is safe, adding refused.
 */
export function savePostage(cmd: { actor: Actor; workshopId: string; input: PostageInput; now: Date }) {
  const { actor, workshopId, input, now } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'settings:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    if (!workshop) return refuse('not_found')
    const zones = await PostageZone.findAll({ where: { workshopId }, transaction: tx })
    const zone = zones.find(({ id }) => id === input.zone)
    if (input.zone !== undefined && !zone) return refuse('not_found')

    const others = zones.filter((each) => each !== zone)
    const countries = countriesFor(input.countries, others)
    const mistakes = { ...takenBy(input.countries, others), ...unchargeable(input, workshop.currency) }
    if (countries.length === 0) mistakes.countries ??= words.nothingLeft
    if (Object.keys(mistakes).length > 0) return refuseFields(mistakes)

    const position = zones.reduce((most, each) => Math.max(most, each.position + 1), 0)
    const saved = zone
      ? await zone.update({ name: input.name, countries }, { transaction: tx })
      : await PostageZone.create({ workshopId, name: input.name, countries, position }, { transaction: tx })
    await replaceServices(tx, saved, input.services, now)
    await openDestinations(tx, workshopId)
    await workshopPagesChanged(tx, workshop)
    return ok({ zone: saved.id })
  })
}

/** 'EU' written out as the member states that no other zone and no other entry names. */
function countriesFor(typed: readonly string[], others: readonly PostageZone[]): string[] {
  const named = typed.filter((each) => each !== 'EU')
  if (named.length === typed.length) return named
  const taken = new Set([...named, ...others.flatMap(({ countries }) => countries)])
  return [...named, ...EU_MEMBERS.filter((country) => !taken.has(country))]
}

function takenBy(typed: readonly string[], others: readonly PostageZone[]): Record<string, string> {
  for (const country of typed) {
    const zone = others.find(({ countries }) => countries.includes(country))
    if (!zone) continue
    return {
      countries: country === '*' ? words.otherwiseTaken(zone.name) : words.countryTaken(country, zone.name),
    }
  }
  return {}
}

/** Postage becomes part of a charge, so the provider must be able to write it; it may be nothing. */
function unchargeable({ services }: PostageInput, currency: string): Record<string, string> {
  const found = services.flatMap(({ bands }, i) =>
    bands.flatMap(({ priceMinor }, k) => {
      const asked = priceMinor === 0 ? null : toProvider(priceMinor, currency)
      return asked === null || asked.ok || asked.reason === 'below_minimum'
        ? []
        : [`services.${i}.bands.${k}.priceMinor`]
    }),
  )
  return Object.fromEntries(found.map((field) => [field, words.notChargeable]))
}

async function replaceServices(
  tx: Transaction,
  zone: PostageZone,
  services: PostageInput['services'],
  now: Date,
): Promise<void> {
  await PostageService.update(
    { endedAt: now },
    { where: { zoneId: zone.id, endedAt: null }, transaction: tx },
  )
  await PostageService.bulkCreate(
    services.map(({ bands, ...service }, position) => ({
      workshopId: zone.workshopId,
      zoneId: zone.id,
      ...service,
      position,
      bands: bands
        .map(({ upTo, priceMinor }) => ({ upTo, priceMinor: minor(priceMinor) }))
        .sort((a, b) => a.upTo - b.upTo),
    })),
    { transaction: tx },
  )
}
