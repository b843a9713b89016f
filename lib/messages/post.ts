import { plural } from './plural'

/** Mistakes in a carrier's list, and in what is said of a parcel. */
export const postMistakes = {
  empty: 'The list has headings and nothing below them.',
  unreadable: (line: number) =>
    `Line ${line} cannot be read as a table: a quotation mark is not closed, or the columns do not match.`,
  noOrder: 'No heading says which column holds the order number. Name one “order”.',
  nothing: 'No heading names tracking numbers or states. Name a column “tracking” or “state”.',
  shifted: 'has more or fewer columns than the headings: a cell is missing or has a stray separator',
  formula: 'holds a formula instead of a number',
  orderUnknown: 'no such order in this workshop',
  noParcel: 'this order has no packed or posted parcel that could take it',
  several: 'this order has several parcels; scan this number at the parcel itself',
  twice: 'this number stands in the list twice',
  taken: (parcel: number) => `this number stands on parcel ${parcel} already`,
  has: (tracking: string) => `its parcel has number ${tracking} already`,
  notPosted: 'its parcel was not handed over yet',
  stateUnknown: (typed: string) => `“${typed}” is no state: write delivered, lost or returned`,
  tracking: {
    check_digit: 'mistyped: the check digit does not match',
    characters: 'not a tracking number: use letters, digits and hyphens',
    length: 'longer than any tracking number',
  },
}

/** The packer's page of the way to the post and after. */
export const postWords = {
  title: 'Post',
  lead: 'Hand packed parcels over, take the carrier’s numbers in, and note what arrived.',
  csv: {
    title: 'List for a carrier’s upload',
    hint: 'Packed parcels, a line each, in the columns the carrier asks for.',
    button: 'Make the list',
    sets: { all: 'Every column', address: 'Addresses and services', customs: 'Customs data' },
    choose: 'Or these columns',
    chooseHint: (columns: readonly string[]) =>
      `In the order the carrier wants, commas between. There are: ${columns.join(', ')}.`,
    columns: {
      order: 'Order',
      parcel: 'Parcel',
      name: 'Name',
      organization: 'Company',
      line1: 'Address 1',
      line2: 'Address 2',
      line3: 'Address 3',
      city: 'Town',
      region: 'Region',
      postcode: 'Postcode',
      country: 'Country',
      phone: 'Telephone',
      taxNumber: 'Tax number',
      service: 'Service',
      grams: 'Weight (g)',
      lengthMm: 'Length (mm)',
      widthMm: 'Width (mm)',
      heightMm: 'Height (mm)',
      contents: 'Contents',
      code: 'Customs code',
      origin: 'Origin',
      value: 'Value',
      currency: 'Currency',
      form: 'Customs form',
    },
  },
  tracking: {
    title: 'The carrier’s list',
    hint: 'Paste it with its headings: a column “order”, and “tracking” or “state” (delivered, lost, returned) or both. Nothing is taken in before you have looked at it.',
    field: 'List',
    look: 'Look at it first',
    preview: (good: number, bad: number) =>
      bad === 0
        ? `All ${good} lines can be taken in.`
        : `${plural(good, { one: '# line', other: '# lines' })} can be taken in; ${plural(bad, { one: '# line is', other: '# lines are' })} left out.`,
    caption: 'The list, line by line',
    line: 'Line',
    order: 'Order',
    number: 'Tracking',
    state: 'State',
    verdict: 'What happens',
    verified: 'check digit verified',
    notVerifiable: 'not verifiable',
    taken: 'taken in',
    apply: (good: number) => `Take in ${plural(good, { one: '# line', other: '# lines' })}`,
    none: 'No line can be taken in. Mend the list and look again.',
  },
  report: {
    title: 'What became of it',
    delivered: 'It arrived',
    lost: 'It is lost',
    returned: 'It came back',
    found: 'It turned up and arrived',
    claimBy: 'A loss can be claimed from the post until',
  },
}
