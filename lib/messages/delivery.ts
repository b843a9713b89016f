import { writtenPercent } from './written'

/** Prices, postage and tax of one piece for one country; small, since the island that asks for another country carries it. */
export const deliveryWords = {
  caption: (country: string) => `One piece, delivered to ${country}`,
  offer: 'Form',
  price: 'Price',
  deposit: 'Deposit now',
  postage: 'Postage',
  total: 'In all',
  open: 'open',
  notPosted: 'not posted there',
  states: {
    closed: 'Not posted to this country.',
    paused: 'Not posted to this country at present.',
    no_post: 'No postage to this country has been set yet.',
  },
  noOffers: 'The forms in which it will be sold are not set yet.',
  country: 'Country it goes to',
  countryHint: 'Postage and tax for another country.',
  countryNoScript: 'Postage and tax for other countries are shown before you order.',
  countryFailed: 'The prices for this country could not be loaded. Try again in a moment.',
  tax: {
    included: (rate: number) => `Prices and postage include ${writtenPercent(rate / 10_000)} tax.`,
    added: (rate: number) => `Prices and postage are shown with ${writtenPercent(rate / 10_000)} tax added.`,
    none: 'No sales tax is part of these prices.',
    mixed: 'Prices and postage include the tax of each form.',
  },
  duties: {
    buyer_pays: 'Customs may ask you for tax, duty and a handling fee on arrival; you pay them there.',
    prepaid: 'Tax and duty on arrival are paid by the workshop beforehand.',
    refused: 'Not posted where duty falls due on arrival.',
  },
} as const
