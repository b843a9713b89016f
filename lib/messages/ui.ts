import { plural } from './plural'

/** Dates, numbers and sums are written for this locale unless a workshop's own is handed in. */
export const LOCALE = 'en-GB'

/** The sentences of the pieces themselves; what a page says stands in the messages of its domain. */
export const ui = {
  siteName: 'Brimline',
  home: 'Brimline, first page',
  skipToContent: 'Skip to the content',
  mainNavigation: 'Main',
  legalNavigation: 'About this site',
  terms: 'Terms',
  privacy: 'Privacy',
  accessibility: 'Accessibility',
  optional: 'optional',
  chooseOne: 'Choose one',
  errorPrefix: 'Error:',
  errorTitle: (count: number) =>
    plural(count, { one: 'One thing needs changing', other: '# things need changing' }),
  change: 'Change',
  close: 'Close',
  copy: 'Copy',
  copied: 'Copied',
  loading: 'Loading',
  progress: (done: number, total: number) => `${done} of ${total}`,
  failed: (count: number) => plural(count, { one: '# did not succeed', other: '# did not succeed' }),
  sheetOf: (sheet: number, of: number) => `${sheet} of ${of}`,
  what: 'What',
  revision: 'Rev.',
  who: 'By',
  when: 'Date',
  sheet: 'Sheet',
  sortBy: (heading: string) => `Sort by ${heading}`,
  sortedUp: 'sorted, lowest first',
  sortedDown: 'sorted, highest first',
  actions: 'Actions',
  csv: 'Download these rows as CSV',
  first: 'First page',
  next: 'Next page',
  paging: 'Pages of this list',
  typeToConfirm: 'Type this to go on:',
  stepDone: 'done',
  stepNow: 'now',
  stepToCome: 'to come',
  inTable: 'The same figures as a table',
  notFoundTitle: 'There is nothing here',
  notFoundWords: 'The address may be mistyped, or what stood here may be gone or not yours to see.',
  toHome: 'Go to the first page',
  brokeTitle: 'Something went wrong on our side',
  brokeWords: 'Nothing you sent has been counted twice. Try again; if it happens again, tell us this number:',
  tryAgain: 'Try again',
}
export type UiMessages = typeof ui
