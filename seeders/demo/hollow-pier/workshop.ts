import type { WorkshopPlan } from '../acts/found-workshop'
import { PEOPLE } from '../people'

const parcel = (name: string, first: string, second: string) => ({
  name,
  kind: 'parcel',
  maxGrams: 5000,
  maxMm: 600,
  tracked: 'on',
  bands: [
    { upTo: 1000, priceMinor: first },
    { upTo: 5000, priceMinor: second },
  ],
})

/** Mara Quill's workshop on the harbour: modules in euros, posted from Hamburg. */
export const HOLLOW_PIER: WorkshopPlan = {
  owner: PEOPLE.mara,
  host: PEOPLE.host,
  start: {
    name: 'Hollow Pier Modular',
    slug: 'hollow-pier',
    legalName: 'Mara Quill',
    country: 'DE',
    currency: 'EUR',
    timeZone: 'Europe/Berlin',
    replyTo: PEOPLE.mara,
  },
  details: {
    name: 'Hollow Pier Modular',
    legalName: 'Mara Quill',
    replyTo: PEOPLE.mara,
    postalAddress: {
      country: 'DE',
      name: 'Mara Quill',
      lines: ['Kaischuppen 9'],
      postcode: '20457',
      city: 'Hamburg',
    },
    about:
      'Two benches above a boat shed. We make small runs of modules we wanted ourselves, and mend what we sold.',
    taxMode: 'home_rate',
    pricesIncludeTax: 'on',
    depositsTaxed: 'on',
    headStartHours: 48,
    limitPerPerson: 4,
    lapseAfterDays: 14,
  },
  postage: [
    { name: 'Germany', countries: 'DE', services: [parcel('Parcel', '490', '790')] },
    { name: 'European Union', countries: 'EU', services: [parcel('Parcel abroad', '1190', '1690')] },
    { name: 'Everywhere else', countries: '*', services: [parcel('Parcel worldwide', '1990', '2990')] },
  ],
  terms: {
    body: [
      'Your deposit is kept for you until we decide. If the run does not come together, everyone gets everything back.',
      'Until the run is locked you cancel with two clicks and get your whole deposit back.',
      'After that the balance is asked for before we pack, at least seven days ahead.',
      'Consumers in the EU and the UK may withdraw until fourteen days after the last piece arrived.',
    ].join('\n\n'),
  },
  members: [
    { email: PEOPLE.jonas, role: 'bench' },
    { email: PEOPLE.lene, role: 'packer' },
  ],
}
