import type { WorkshopPlan } from '../acts/found-workshop'
import { PEOPLE } from '../people'

const parcel = (name: string, priceMinor: string) => ({
  ...{ name, kind: 'parcel', maxGrams: 2000, maxMm: 450, tracked: 'on' },
  bands: [{ upTo: 2000, priceMinor }],
})

/** Gwen Tallis's workshop in the fens: one module so far, in pounds. */
export const FEN_LAMP: WorkshopPlan = {
  owner: PEOPLE.gwen,
  host: PEOPLE.host,
  start: {
    name: 'Fen Lamp Circuits',
    slug: 'fen-lamp',
    legalName: 'Gwen Tallis',
    country: 'GB',
    currency: 'GBP',
    timeZone: 'Europe/London',
    replyTo: PEOPLE.gwen,
  },
  details: {
    name: 'Fen Lamp Circuits',
    legalName: 'Gwen Tallis',
    replyTo: PEOPLE.gwen,
    postalAddress: {
      country: 'GB',
      name: 'Gwen Tallis',
      lines: ['4 Drove End'],
      postcode: 'CB7 4UN',
      city: 'Ely',
    },
    about: 'One person, one bench, one module at a time.',
    taxMode: 'not_registered',
    taxNote: 'Not registered for VAT; no VAT is charged.',
    pricesIncludeTax: 'on',
    headStartHours: 24,
    limitPerPerson: 2,
    lapseAfterDays: 14,
  },
  postage: [
    { name: 'United Kingdom', countries: 'GB', services: [parcel('Tracked parcel', '480')] },
    { name: 'Everywhere else', countries: '*', services: [parcel('Tracked parcel abroad', '1650')] },
  ],
  terms: {
    body: 'If there is no run you get everything back. Until it is locked you cancel with two clicks. Then I build and post.',
  },
  members: [],
}
