/** Mistakes in a module's forms that only the services can see, at their fields. */
export const moduleMistakes = {
  slugTaken: 'Another module of yours has this address. Choose another.',
  letterTaken: 'This module has a revision of that letter already.',
  revisionUnknown: 'This module has no revision of that letter.',
  mendedBefore: 'A lesson is mended in a later revision than the one it was found on.',
  partUnknown: 'You have no part of this code.',
  partItself: 'This is the part itself. Enter another.',
  notYet: 'This day has not come yet.',
  notAMember: 'Choose somebody who works for the workshop.',
  priceList: 'Enter prices between commas, rising, at most eight: 75, 85, 95.',
  chargeable: {
    below_minimum: 'This is less than the payment provider charges at least. Enter more.',
    above_maximum: 'This is more than the payment provider charges at most. Enter less.',
    not_representable: 'The payment provider cannot write this amount. Choose one it can.',
  },
  vague: 'Customs refuse a description that fits any parcel. Say what it is: “audio mixer, kit of parts”.',
  otherCurrency: 'Amounts are entered in your workshop’s currency.',
  csv: {
    empty: 'The list has headings but no lines.',
    unreadable: 'This cannot be read as lines with separators. Check the quotation marks.',
    heading: (names: string) => `These headings are missing: ${names}.`,
    line: (line: number, heading: string, words: string) => `Line ${line}, ${heading}: ${words}`,
    twice: 'This part stands in the list twice. One line per distinct part.',
    choice: (code: string, answer: string) => `${code}: no choice of this module has the answer “${answer}”.`,
    quote: 'A quote needs supplier, currency, breaks and quoted_on together.',
    placed: 'Write assembler, maker or buyer for at least one offer.',
  },
} as const
