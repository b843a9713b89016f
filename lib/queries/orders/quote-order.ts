import 'server-only'
import type { Transaction } from 'sequelize'
import { orderMistakes } from '@/lib/contracts/order-mistakes'
import type { OrderInput } from '@/lib/contracts/orders'
import { refuseFields, type FieldRefusal } from '@/lib/contracts/problem'
import { packedTogether } from '@/lib/core/orders/packed'
import { orderTotals, type OrderTotals } from '@/lib/core/orders/totals'
import { postage } from '@/lib/core/post/postage'
import { ok, refuse, type Result } from '@/lib/core/result'
import { dayIn } from '@/lib/core/time/zone'
import { addressErrors } from '@/lib/queries/orders/address-errors'
import { loadOffers, loadPost, loadRates, type QuotedOffer } from '@/lib/queries/orders/quote-data'
import { chooseAnswers } from '@/lib/queries/orders/choose-answers'
import type { Run, Workshop } from '@/models'
import type { ChosenAnswer, PostageQuote } from '@/models/json'

export type QuotedLine = {
  offer: QuotedOffer
  quantity: number
  choices: ChosenAnswer[]
  surchargeMinor: number
  basisPoints: number
}

/** An order as it would be placed now: everything that is then fixed for it. */
export type OrderQuote = {
  lines: QuotedLine[]
  units: number
  country: string
  totals: OrderTotals
  postage: PostageQuote
  postageBasisPoints: number
}

type Asked = {
  workshop: Workshop
  run: Run
  input: Pick<OrderInput, 'lines' | 'address'>
  now: Date
  transaction?: Transaction
}

/**
 * Prices an order: offers, choices, postage by packed weight, tax of the destination. Six statements, however many lines.
 * Refuses: with a sentence at each field (unknown offer, choice, country, what the address lacks, no postage) ·
 * weights_missing (the workshop has not weighed an offer).
 */
export async function quoteOrder(
  asked: Asked,
): Promise<Result<OrderQuote, 'weights_missing'> | FieldRefusal> {
  const { workshop, run, input, transaction } = asked
  const { country } = input.address
  const offers = await loadOffers(run.id, country, transaction)
  const errors: Record<string, string> = { ...addressErrors(input.address) }
  const chosen = input.lines.map((line, index) => {
    const offer = offers.find(({ kind }) => kind === line.offer)
    const at = `lines.${index}`
    if (!offer) errors[`${at}.offer`] = orderMistakes.offer
    if (input.lines.findIndex((other) => other.offer === line.offer) !== index)
      errors[`${at}.offer`] = orderMistakes.offerTwice
    if (!offer) return null
    const answers = chooseAnswers(offer, line.choices ?? {}, `${at}.choices`)
    Object.assign(errors, answers.errors, destinationErrors(offer, input.address))
    return { offer, quantity: line.quantity, choices: answers.choices }
  })
  if (Object.keys(errors).length > 0) return refuseFields(errors)
  const lines = chosen.filter((line) => line !== null)

  const packed = packedOf(lines)
  if (packed === null) return refuse('weights_missing')
  const post = await loadPost(workshop.id, transaction)
  const price = postage(post.zones, country, packed.grams, packed.sizeMm)
  if (!price.ok) return refuseFields(postageErrors[price.reason])

  const rateOf = await loadRates(workshop, country, dayIn(asked.now, workshop.timeZone), transaction)
  const quoted = lines.map((line) => ({
    ...line,
    surchargeMinor: line.choices.reduce((sum, { surchargeMinor }) => sum + surchargeMinor, 0),
    basisPoints: rateOf(line.offer.taxClass),
  }))
  // Postage is taxed as the goods it carries; where they differ, at the highest of their rates.
  const postageBasisPoints = Math.max(...quoted.map(({ basisPoints }) => basisPoints))
  const totals = orderTotals({
    lines: quoted.map(({ offer, ...line }) => ({
      ...line,
      priceMinor: offer.priceMinor,
      depositMinor: offer.depositMinor,
    })),
    postageMinor: price.value.price,
    postageBasisPoints,
    pricesIncludeTax: workshop.pricesIncludeTax,
  })
  return ok({
    lines: quoted,
    units: quoted.reduce((sum, { quantity }) => sum + quantity, 0),
    country,
    totals,
    postage: {
      zoneId: price.value.zone,
      serviceId: price.value.service,
      serviceName: post.nameOf(price.value.service),
      grams: packed.grams,
      priceMinor: price.value.price,
    },
    postageBasisPoints,
  })
}

const postageErrors = {
  no_zone: { 'address.country': orderMistakes.noZone },
  too_heavy: { 'lines.0.quantity': orderMistakes.tooHeavy },
  too_large: { 'lines.0.quantity': orderMistakes.tooLarge },
} as const

function destinationErrors(offer: QuotedOffer, address: OrderInput['address']): Record<string, string> {
  const { destination } = offer
  if (destination === null || destination.state !== 'open')
    return { 'address.country': orderMistakes.closed(destination?.reason ?? null) }
  return {
    ...(destination.asksPhone && !address.phone ? { 'address.phone': orderMistakes.phone } : {}),
    ...(destination.asksTaxNumber && !address.taxNumber
      ? { 'address.taxNumber': orderMistakes.taxNumber }
      : {}),
  }
}

function packedOf(lines: readonly { offer: QuotedOffer; quantity: number }[]) {
  const pieces = lines.map(({ offer, quantity }) => offer.packed && { quantity, ...offer.packed })
  return pieces.every((piece) => piece !== null) ? packedTogether(pieces) : null
}
