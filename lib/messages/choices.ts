import { plural } from './plural'

/** The questions an offer asks its buyers. */
export const choiceWords = {
  title: 'Choices',
  lead: 'Questions every buyer of this offer answers, such as the finish of the front panel. A parts list names the answer a part is for.',
  when: ({ askedAfterLock, answerWithinDays }: { askedAfterLock: boolean; answerWithinDays: number }) =>
    askedAfterLock
      ? `Asked after the lock, to be answered within ${plural(answerWithinDays, { one: '# day', other: '# days' })}.`
      : 'Asked with the order.',
  standsIn: 'stands in until chosen',
  retire: 'Ask no longer',
  retireNamed: (question: string) => `Ask no longer: ${question}`,
  add: 'Ask one more question',
  question: 'Question',
  questionHint: 'Such as “Front panel finish”.',
  answers: 'Answers',
  answersHint: 'Two to four. A question is not changed later, since orders name it: retire it and ask anew.',
  answer: (row: number) => `Answer ${row}`,
  label: 'Answer',
  surcharge: 'Costs more',
  askedAfterLock: 'Ask only once the run is locked',
  answerWithinDays: 'To be answered within',
  answerWithinHint: 'Empty: 14.',
  days: 'd',
} as const
