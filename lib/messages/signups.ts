import { plural } from './plural'

/** Registering interest: the form, its mistakes, and what follows by link. */
export const signUpWords = {
  offerUnknown: 'This module is not offered in that form. Choose one of the offers shown.',
  countryUnknown: 'Choose a country from the list.',
  priceUnknown: 'Choose one of the prices shown for this form.',

  title: 'Would you like one?',
  lead: 'Free, and binding on nobody. You get one mail to confirm your address; only then does it count.',
  offer: 'In which form',
  quantity: 'How many',
  quantityHint: 'From 1 to 10.',
  country: 'Where it would go',
  certainty: 'How sure are you?',
  certainties: {
    certain: ['Certain', 'I would pay a deposit when it opens.'],
    likely: ['Likely', 'If nothing comes in between.'],
    curious: ['Curious', 'I want to see how it goes.'],
  } as const,
  topPrice: 'The highest price at which you would still join',
  topPriceHint: 'The price is still open. Whatever people answer here, everyone pays the same price.',
  topPriceOnly: (offers: string) => `Asked for: ${offers}.`,
  topPriceFor: (offers: string) => `for ${offers}`,
  noTopPrice: 'I would rather not say',
  email: 'E-mail address',
  emailHint: 'For the confirmation and the invitation when deposits open; nobody else sees it.',
  updates: 'Also send me news of this module; every such mail has a link that stops them.',
  send: 'Register my interest',
  again:
    'Registered before? Sign up again with the same address: confirmed, it replaces what you said earlier.',
  resumedTitle: (module: string) => `Interest in ${module}`,

  sentTitle: 'Now look into your mailbox',
  sentLead:
    'We have written to the address you gave. Your sign-up counts once you follow the link in that mail.',
  sentLater:
    'What is not confirmed is deleted after 14 days. No mail? Look among the unwanted ones, or sign up again.',
  toModule: 'Back to the module',

  units: (count: number) => plural(count, { one: '# unit', other: '# units' }),
  what: 'Module',
  form: 'Form',
  goesTo: 'Country',
  confirmTitle: 'Confirm your interest',
  confirmLead: (workshop: string) => `One click, and ${workshop} counts you in. It is not an order.`,
  confirm: 'Confirm my interest',
  confirmedTitle: 'Your interest is confirmed',
  confirmedLead: (module: string) =>
    `It counts now. When deposits for ${module} open, you are invited by mail, before everybody else.`,
  confirmedAlready: 'This sign-up is confirmed. There is nothing more to do.',
  supersededTitle: 'A later sign-up has replaced this one',
  superseded: 'You signed up again for the same module; the later one counts.',
  takenBackTitle: 'This sign-up was taken back',
  takenBack: 'It no longer counts, and open invitations to it have ended. You can sign up again at any time.',
  expiredTitle: 'This link has expired',
  expired: 'It was not confirmed within 14 days. Sign up again; it takes a minute.',
  unknownTitle: 'This link does not work',
  unknown:
    'It may be incomplete, or what it was about may be deleted. Open it from the mail again, or sign up anew.',
  takeBackTitle: 'Change it or take it back',
  takeBackLead: 'Your sign-up as it counts now.',
  takeBack: 'Take my sign-up back',
  takeBackNote: 'Open invitations to it end as well. An order you have placed is not touched.',
  change: 'Change it: sign up again',
  signUpAgain: 'Sign up again',

  unsubscribeTitle: 'Stop news and invitations',
  unsubscribeLead: (workshop: string) =>
    `${workshop} will send you no more news and no invitations. What an order needs still comes.`,
  unsubscribe: 'Stop these mails',
  unsubscribedTitle: 'These mails have ended',
  unsubscribed: (workshop: string) => `${workshop} sends you no more news and no invitations.`,
} as const
