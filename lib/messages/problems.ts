/** Mistakes at the fields of a problem. */
export const problemMistakes = {
  sum: 'Enter the sum you pay back, above zero.',
  tooMuch: 'So much was not paid, or is not left to pay back. Enter less.',
}

const kinds = {
  missing_part: 'A part is missing',
  fault: 'It has a fault',
  wrong: 'Something wrong was sent',
  damaged: 'It arrived damaged',
  lost: 'The parcel has not arrived',
  other: 'Something else',
}

/** Problems after posting, on the buyer's page and the owner's. */
export const problemWords = {
  title: 'Problems',
  report: 'Report a problem',
  reportHint:
    'Tell us what is wrong with what was posted. You hear from the maker by the day shown then; you never wait for the post to finish looking.',
  kind: 'What is wrong',
  story: 'What happened',
  storyHint: 'What you see, hear or measure; which part is missing.',
  button: 'Send the report',
  kinds,
  states: { open: 'being looked at', answered: 'answered', closed: 'closed' },
  answerBy: 'You hear by',
  lead: 'What buyers have reported, the longest waiting first.',
  caption: 'Problems reported by buyers',
  empty: 'No buyer has reported a problem.',
  number: 'Report',
  order: 'Order',
  what: 'What',
  state: 'State',
  by: 'Answer by',
  answerTitle: (number: number, order: string) => `Report ${number}, order ${order}`,
  remedy: 'What you do',
  remedies: {
    replacement: 'Send a replacement',
    part: 'Send the part in a letter',
    repair: 'Repair it',
    part_refund: 'Pay a part back',
    full_refund: 'Pay everything back',
    message: 'Only write',
  },
  remediesForBuyer: {
    replacement: 'We send you a replacement',
    part: 'We send you the part',
    repair: 'We repair it',
    part_refund: 'We pay a part back',
    full_refund: 'We pay everything back',
    message: 'We wrote to you',
  },
  remedyHints: {
    replacement: 'Its parcel comes into the pack queue at once, declared at its true value.',
    part: 'You send it yourself; the buyer reads your words.',
    repair: 'Say in your words how it comes to you and who pays the way.',
    part_refund: 'The sum below goes back the way it was paid.',
    full_refund: 'All that was paid and not paid back yet goes back.',
    message: '',
  },
  answer: 'Your words to the buyer',
  sum: 'Sum to pay back',
  send: 'Answer: tell the buyer',
}
