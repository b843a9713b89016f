import type { ParcelCustoms } from '@/lib/contracts/papers'
import { crossesCustoms } from '@/lib/core/post/customs-territory'
import { customsForm, type CustomsItem, customsLines, declarationProblems } from '@/lib/core/post/customs'
import { sdrRateOf } from '@/lib/core/post/sdr-rates'
import type { contentsOf } from '@/lib/queries/packing/find-parcels'
import type { Parcel, Workshop } from '@/models'

type Contents = ReturnType<typeof contentsOf>
type Given = {
  parcel: Parcel
  contents: Contents
  workshop: Workshop
  duties: ParcelCustoms['duties']
  /** Letter or parcel, as its service is; a parcel while none is chosen. */
  kind: 'letter' | 'parcel'
  grams: number | null
  signedBy: string
  signedOn: string
}

/** What a parcel's customs form says, which form it is, and what still stops it. */
export function declareParcel(given: Given): ParcelCustoms {
  const { parcel, contents, workshop, kind, grams } = given
  const address = parcel.address!.facts()
  const items = contents.map(itemOf)
  const lines = customsLines({ items })
  const valueMinor = lines.reduce((sum, { value }) => sum + value, 0)
  const from = { country: workshop.country, postcode: workshop.postalAddress?.postcode }
  const to = { country: address.country, postcode: address.postcode }
  const { currency } = parcel
  const problems = declarationProblems({
    from: {
      ...from,
      name: workshop.legalName ?? workshop.name,
      lines: workshop.postalAddress?.lines ?? [],
      phone: workshop.phone ?? undefined,
      email: workshop.replyTo ?? undefined,
    },
    to: {
      ...to,
      name: address.latin?.name ?? address.name,
      lines: address.latin?.lines ?? address.lines,
      phone: address.phone,
      taxNumber: address.taxNumber,
    },
    contents: parcel.problemId === null ? 'sale' : 'other',
    currency,
    lines: lines.map((line) => ({ ...line })),
    grossGrams: grams ?? undefined,
    signedBy: given.signedBy,
    signedOn: given.signedOn,
    invoice: String(parcel.number),
  })
  return { form: formOf(), lines, valueMinor, currency, problems, duties: given.duties }

  function formOf(): ParcelCustoms['form'] {
    const sdrRate = sdrRateOf(currency)
    if (sdrRate === undefined) return crossesCustoms(from, to) ? 'CN23' : 'none'
    return customsForm({
      from,
      to,
      value: valueMinor,
      currency,
      sdrRate,
      grams: grams ?? 0,
      service: kind,
    })
  }
}

/** True value of one: what was paid for it; of a piece that was free, what it sells for. */
function itemOf({ line, quantity }: Contents[number]): CustomsItem {
  const offer = line.runOffer!.offer!
  const paid = line.unitPriceMinor + line.unitSurchargeMinor
  return {
    description: offer.customsDescription,
    quantity,
    unitValue: paid > 0 ? paid : (line.runOffer!.priceMinor ?? offer.priceMinor ?? 0),
    unitGrams: offer.netWeightG ?? 0,
    code: offer.customsCode,
    origin: offer.customsOrigin ?? '',
  }
}
