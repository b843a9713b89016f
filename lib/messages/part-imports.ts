import { plural } from './plural'
import { writtenNumber } from './written'

const lines = (count: number) => plural(count, { one: '# line', other: '# lines' })

/** Importing a parts list or quotes: what is in the file, what is wrong with it, what it would change. */
export const importWords = {
  title: 'Import parts',
  lead: 'Nothing is saved before you have seen how the file is read and confirmed it.',
  toParts: 'Parts list',
  start: 'A file, or text',
  kind: 'What is in it',
  kinds: {
    lines: 'The parts list of a revision: it replaces the list there is',
    quotes: 'Quotes: prices of parts you already have, one line per quote',
  },
  revision: 'Revision',
  file: 'File',
  fileHint: 'CSV, TSV or plain text from any spreadsheet, 4 MB and 5,000 lines at most.',
  text: 'Or paste it here',
  textHint:
    'The first line names the columns. Under boards, kit and built write who places the part: assembler, maker or buyer. Prices look like 1: 0.12; 100: 0.09.',
  nothing: 'Choose a file, or paste the lines.',
  look: 'See how it is read',
  columnsUsed: 'Columns you can use',

  how: 'How it is read',
  fromFile: (name: string, count: number) => `${name === '' ? 'Pasted text' : name}: ${lines(count)}.`,
  encoding: 'Encoding',
  encodingHint: 'If letters such as ä, µ or Ω look wrong below, try another.',
  encodings: {
    'utf-8': 'UTF-8',
    'windows-1252': 'Western European (Windows-1252)',
    'utf-16le': 'UTF-16, little end first',
    'utf-16be': 'UTF-16, big end first',
  },
  delimiter: 'Cells are separated by',
  delimiters: { comma: 'a comma', semicolon: 'a semicolon', tab: 'a tab', pipe: 'an upright line' },
  columns: 'Columns of the file',
  columnsHint: 'Say what each column is. What is left out is not read.',
  leftOut: 'left out',
  example: (text: string) => (text === '' ? 'empty in the first line' : `such as ${text}`),
  placedBy: 'Who places a part where the file does not say',
  placers: { '': 'nobody: not part of it', assembler: 'assembler', maker: 'you', buyer: 'the buyer' },
  readAgain: 'Read it this way',

  changes: 'What would change',
  changesCaption: 'Lines that would be added, removed or changed',
  changesSum: (added: number, removed: number, changed: number, same: number) =>
    `${lines(added)} added, ${writtenNumber(removed)} removed, ${writtenNumber(changed)} changed, ${writtenNumber(same)} as they are.`,
  noChanges: 'Nothing would change.',
  tooManyChanges: (shown: number, all: number) =>
    `The first ${writtenNumber(shown)} of ${writtenNumber(all)} are shown.`,
  what: { added: 'added', removed: 'removed', changed: 'changed' },
  part: 'Part',
  change: 'Change',
  field: (name: string, before: string, after: string) =>
    `${name}: ${before === '' ? 'nothing' : before} → ${after === '' ? 'nothing' : after}`,

  mistakes: 'To be mended before it can be saved',
  mistakesLead: 'Mend the file and send it again, or read its columns another way.',
  line: (line: number) => `Line ${writtenNumber(line)}`,
  wholeFile: 'Whole file',
  noMistakes: 'Every line can be read.',
  findings: 'What the check finds',
  findingsLead: 'None of this keeps you from saving; an error keeps a run from being ready.',
  moreOf: (shown: number, all: number) => `${writtenNumber(shown)} of ${writtenNumber(all)} are shown.`,

  mend: 'Mend it here',
  mendText: 'The file as text',
  mendHint: 'Line 1 are the headings. Change what is wrong; nothing is saved by looking again.',
  lookAgain: 'Look at it again',

  preview: 'The first lines as they are read, and every line something is wrong with',
  lineHeading: 'Line',
  remark: 'Remark',
  confirm: (count: number, isQuotes: boolean) =>
    isQuotes
      ? `Save ${plural(count, { one: '# quote', other: '# quotes' })}`
      : `Replace the parts list by ${lines(count)}`,
  anew: 'Send another file',
} as const
