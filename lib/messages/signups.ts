/** Registering interest: the form, its mistakes, and what follows by link. */
export const signUpWords = {
  offerUnknown: 'This module is not offered in that form. Choose one of the offers shown.',
  countryUnknown: 'Choose a country from the list.',
  priceUnknown: 'Choose one of the prices shown.',
}
