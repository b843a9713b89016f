import 'server-only'
import type { OfferInput } from '@/lib/contracts/module-forms'
import { refuseFields } from '@/lib/contracts/problem'
import { minor, type Minor } from '@/lib/core/brand'
import { parseMoney } from '@/lib/core/money/parse'
import { toProvider } from '@/lib/core/money/provider'
import { can, type Actor } from '@/lib/core/policy/can'
import { isVague } from '@/lib/core/post/vague-words'
import { ok, refuse } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { moduleMistakes as mistakes } from '@/lib/messages/module-mistakes'
import { Offer, Workshop } from '@/models'
import { lockModule } from '../_steps/find-module'
import { modulePageChanged } from '../_steps/module-page-changed'
import { openDestinations } from '../_steps/open-destinations'

/** Order of the forms on the page. */
const POSITION = { boards: 0, kit: 1, built: 2 } as const
const MOST_PRICES = 8

/**
 * Adds or changes one form in which a module is sold. Runs hold their own copy of the prices, so what is on sale now does
 * not change. A new offer is posted to every country of the zones.
 * Refuses: not_found · forbidden · invalid (an amount the provider cannot charge; a list of prices that cannot be read or
 * does not rise; a description customs would refuse; amounts in another currency). Locks: the workshop, the module.
 * Writes: offer, destinations; the public page is made anew. Repeat: safe.
 */
export function saveOffer(cmd: {
  actor: Actor
  workshopId: string
  module: string
  input: OfferInput
  now: Date
}) {
  const { actor, workshopId, now } = cmd
  return inTransaction(async (tx) => {
    if (!can(actor, 'offer:write', { workshopId })) return refuse('forbidden')
    const workshop = await Workshop.findByPk(workshopId, { transaction: tx, lock: tx.LOCK.UPDATE })
    const module = await lockModule(tx, workshopId, cmd.module)
    if (!workshop || !module) return refuse('not_found')
    const { offer: kind, currency = workshop.currency, priceList, withdrawn, ...input } = cmd.input
    if (currency !== workshop.currency) return refuseFields({ priceMinor: mistakes.otherCurrency })
    const prices = pricesOf(priceList, currency)
    const wrong = { ...unchargeable(input, currency), ...vague(input.customsDescription), ...prices.errors }
    if (Object.keys(wrong).length > 0) return refuseFields(wrong)

    const before = await Offer.findOne({ where: { moduleId: module.id, kind }, transaction: tx })
    const columns = {
      ...input,
      priceMinor: amountOrNull(input.priceMinor),
      depositMinor: amountOrNull(input.depositMinor),
      priceListMinor: prices.list,
      netWeightG: input.netWeightG ?? null,
      packedWeightG: input.packedWeightG ?? null,
      lengthMm: input.lengthMm ?? null,
      widthMm: input.widthMm ?? null,
      heightMm: input.heightMm ?? null,
      customsOrigin: input.customsOrigin ?? null,
      storagePlace: input.storagePlace,
      position: POSITION[kind],
      withdrawnAt: withdrawn ? (before?.withdrawnAt ?? now) : null,
    }
    const saved = before
      ? await before.update(columns, { transaction: tx })
      : await Offer.create({ workshopId, moduleId: module.id, kind, ...columns }, { transaction: tx })
    await openDestinations(tx, workshopId)
    await modulePageChanged(tx, module.id)
    return ok({ module: module.slug, offer: saved.kind })
  })
}

const amountOrNull = (amount: number | undefined): Minor | null =>
  amount === undefined ? null : minor(amount)

/** The price must be one the provider can write, the deposit one it can charge by itself. */
function unchargeable(
  { priceMinor, depositMinor }: Pick<OfferInput, 'priceMinor' | 'depositMinor'>,
  currency: string,
): Record<string, string> {
  const found = Object.entries({ priceMinor, depositMinor }).flatMap(([field, amount]) => {
    const asked = amount === undefined ? null : toProvider(amount, currency)
    return asked === null || asked.ok ? [] : [[field, mistakes.chargeable[asked.reason]] as const]
  })
  return Object.fromEntries(found)
}

const vague = (description: string): Record<string, string> =>
  description !== '' && isVague(description) ? { customsDescription: mistakes.vague } : {}

function pricesOf(
  typed: string | undefined,
  currency: string,
): { list: Minor[]; errors: Record<string, string> } {
  const amounts = (typed ?? '')
    .split(/[;\s]+|,\s+|,$/)
    .filter((each) => each !== '')
    .map((each) => parseMoney(each, currency))
  const list = amounts.flatMap((amount) => (amount.ok ? [amount.value] : []))
  const rises = list.every((price, i) => price > (list[i - 1] ?? 0))
  const areChargeable = list.every((price) => toProvider(price, currency).ok)
  if (list.length < amounts.length || list.length > MOST_PRICES || !rises)
    return { list: [], errors: { priceList: mistakes.priceList } }
  const errors: Record<string, string> = areChargeable
    ? {}
    : { priceList: mistakes.chargeable.not_representable }
  return { list, errors }
}
