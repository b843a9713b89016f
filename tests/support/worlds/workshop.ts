import type { CreationAttributes } from 'sequelize'
import { minor } from '@/lib/core/brand'
import { PostageService, PostageZone, TermsVersion, Workshop } from '@/models'
import { NOW, serial } from './base'
import { makePerson, makeUser } from './person'

/** An open workshop in Hamburg that can take payments, with its owner, its terms and its post. */
export async function makeWorkshop(over: Partial<CreationAttributes<Workshop>> = {}) {
  const number = serial()
  const owner = await makePerson()
  const workshop = await Workshop.create({
    slug: `workshop-${number}`,
    name: `Workshop ${number}`,
    state: 'open',
    currency: 'EUR',
    timeZone: 'Europe/Berlin',
    country: 'DE',
    taxMode: 'home_rate',
    legalName: 'Mara Quill',
    postalAddress: {
      country: 'DE',
      name: 'Mara Quill',
      lines: ['Am Kai 3'],
      postcode: '20457',
      city: 'Hamburg',
    },
    replyTo: `workshop-${number}@example.org`,
    providerAccountId: `acct_${number}`,
    chargesEnabledAt: NOW,
    payoutsManualAt: NOW,
    createdAt: NOW,
    createdByPersonId: owner.id,
    openedAt: NOW,
    ...over,
  })
  await makeUser({ person: owner, workshopId: workshop.id, role: 'owner' })
  const terms = await TermsVersion.create({
    workshopId: workshop.id,
    number: 1,
    body: 'Deposits are returned in full until the run is locked.',
    publishedAt: NOW,
    publishedByPersonId: owner.id,
  })
  const post = await makePost(workshop)
  return { workshop, owner, terms, ...post }
}

/** Three zones with a letter and a parcel each: at home, the neighbours, everywhere else. */
async function makePost(workshop: Workshop) {
  const zones: PostageZone[] = []
  const places = [
    { name: 'At home', countries: ['DE'], price: 490 },
    { name: 'Neighbours', countries: ['AT', 'FR', 'NL', 'GB'], price: 990 },
    { name: 'Everywhere else', countries: ['*'], price: 1790 },
  ]
  for (const [position, { name, countries, price }] of places.entries()) {
    const zone = await PostageZone.create({ workshopId: workshop.id, name, countries, position })
    await PostageService.create({
      workshopId: workshop.id,
      zoneId: zone.id,
      name: 'Parcel',
      kind: 'parcel',
      maxGrams: 5000,
      maxMm: 600,
      bands: [
        { upTo: 1000, priceMinor: minor(price) },
        { upTo: 5000, priceMinor: minor(price + 600) },
      ],
    })
    zones.push(zone)
  }
  return { zones }
}
