import type { CreationAttributes } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { Destination, Module, Offer, Revision, type Workshop } from '@/models'
import type { OfferKind } from '@/models/words'
import { NOW, serial } from './base'

const FORMS: { kind: OfferKind; price: number; deposit: number; grams: number }[] = [
  { kind: 'boards', price: 4500, deposit: 1000, grams: 150 },
  { kind: 'kit', price: 9500, deposit: 2500, grams: 420 },
  { kind: 'built', price: 16500, deposit: 4000, grams: 460 },
]

/** A published module with a proven revision and all three offers, posted to DE, AT, GB, US and JP. */
export async function makeModule(workshop: Workshop, over: Partial<CreationAttributes<Module>> = {}) {
  const number = serial()
  const module = await Module.create({
    workshopId: workshop.id,
    slug: `module-${number}`,
    name: `Module ${number}`,
    oneLine: 'Clock divider with swing per output',
    state: 'published',
    widthHp: 10,
    depthMm: 28,
    plus12Ma: 45,
    createdAt: NOW,
    publishedAt: NOW,
    ...over,
  })
  const revision = await Revision.create({
    workshopId: workshop.id,
    moduleId: module.id,
    letter: 'A',
    state: 'proven',
    createdAt: NOW,
    firstGoodAt: NOW,
    firstGoodByPersonId: workshop.createdByPersonId,
    firstGoodHow: 'Measured on the bench, every step passed.',
  })
  const offers = {} as Record<OfferKind, Offer>
  for (const [position, form] of FORMS.entries()) {
    offers[form.kind] = await makeOffer(module, form, position)
  }
  return { module, revision, offers }
}

async function makeOffer(module: Module, form: (typeof FORMS)[number], position: number) {
  const { workshopId } = module
  const offer = await Offer.create({
    workshopId,
    moduleId: module.id,
    kind: form.kind,
    priceMinor: minor(form.price),
    depositMinor: minor(form.deposit),
    netWeightG: form.grams - 100,
    packedWeightG: form.grams,
    lengthMm: 200,
    widthMm: 140,
    heightMm: 60,
    customsDescription: 'Electronic module for a music synthesizer',
    customsCode: '920710',
    customsOrigin: 'DE',
    cautions: 'Hot iron: burns and fumes. Turn the power header the right way round. No mains inside.',
    position,
  })
  await Destination.bulkCreate(
    ['DE', 'AT', 'GB', 'US', 'JP'].map((country) => ({ workshopId, offerId: offer.id, country })),
  )
  return offer
}
