import type { DeclarationProblem } from '@/lib/core/post/customs'

const FIELDS: Readonly<Record<string, string>> = {
  'from.name': 'the workshop’s legal name',
  'from.lines': 'the workshop’s postal address',
  'from.country': 'the workshop’s country',
  'from.phone': 'the workshop’s telephone or e-mail',
  'from.eori': 'the workshop’s customs number (EORI)',
  'to.name': 'the addressee’s name',
  'to.lines': 'the addressee’s street',
  'to.country': 'the addressee’s country',
  'to.phone': 'the addressee’s telephone',
  contents: 'what the parcel is sent for',
  currency: 'the currency',
  signedBy: 'who signs',
  signedOn: 'the day of signing',
  lines: 'what is in the parcel',
  grossGrams: 'the weight of the parcel',
  description: 'the customs description',
  quantity: 'the number of pieces',
  value: 'the value',
  grams: 'the net weight',
  code: 'the customs code',
  origin: 'the country of origin',
}

const nameOf = (field: string) => FIELDS[field] ?? FIELDS[field.split('.').at(-1) ?? ''] ?? field

/** Where a mistake is mended: at the offer, at the workshop, at the scale, or with the buyer. */
const placeOf = (field: string) => {
  if (field.startsWith('from')) return 'The owner enters it in the workshop’s settings.'
  if (field.startsWith('to')) return 'Ask the buyer to look at the address of the order.'
  if (field.startsWith('lines.')) return 'The owner enters it at the offer, under “Post and customs”.'
  return 'Weigh the parcel, then print again.'
}

const SAYS: Readonly<Record<DeclarationProblem['problem'], (name: string) => string>> = {
  missing: (name) => `Customs want ${name}, and it is missing.`,
  too_vague: (name) =>
    `Customs refuse ${name} as it is: it could stand on any parcel. Say what the thing is.`,
  zero: (name) => `Customs refuse 0 for ${name}.`,
  code_digits: (name) => `The destination wants more digits of ${name}.`,
  not_a_country: (name) => `There is no such country: look at ${name}.`,
  one_code_per_kit: (name) => `A kit has one code, that of what it makes: look at ${name}.`,
  heavier_than_gross: () => 'The things weigh more than the whole parcel.',
  not_latin: (name) => `Customs may not read ${name}: give it in Latin letters too.`,
  called_gift: () => 'Goods that were paid for are no gift.',
}

/** A sentence that says what is missing in a declaration, and who mends it where. */
export const declarationSentence = ({ field, problem }: DeclarationProblem): string =>
  `${SAYS[problem](nameOf(field))} ${placeOf(field)}`
