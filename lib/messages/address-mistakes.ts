/** What is wrong with an address, at its field. */
export const addressMistakes = {
  country: 'Choose a country from the list.',
  missing: 'The post of this country needs this. Fill it in.',
}
