/** Sentences at the fields of an order that only the run, its offers and the post can judge. */
export const orderMistakes = {
  offer: 'This run does not have this offer. Choose another one.',
  offerTwice: 'Each offer can stand here once. Change its quantity instead.',
  choice: 'Choose one of the answers.',
  country: 'Choose a country from the list.',
  closed: (reason: string | null) =>
    reason ?? 'This offer is not posted to this country. Choose another country.',
  noZone: 'The workshop has no postage to this country. Choose another country.',
  tooHeavy: 'This is too heavy for one parcel to this country. Order fewer.',
  tooLarge: 'This is too large for one parcel to this country. Order fewer.',
  needed: {
    name: 'Enter the name on the parcel.',
    lines: 'Enter the street and number.',
    city: 'Enter the town or city.',
    region: 'Enter the state, province or prefecture.',
    postcode: 'Enter the postcode.',
    country: 'Choose a country from the list.',
  } as Readonly<Record<string, string>>,
  phone: 'The post there needs a telephone number. Enter one with its country code.',
  taxNumber: 'Customs there asks for your tax number. Enter it.',
} as const
