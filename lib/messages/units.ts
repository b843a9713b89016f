/** Mistakes in a list of finished units. */
export const unitMistakes = {
  tooMany: (most: number) => `Enter at most ${most} units at once.`,
  unreadable: (line: number) =>
    `Line ${line}: put one serial number on it, or the number and its form with ; between.`,
  tooLong: (line: number) => `Line ${line}: a serial number has at most 40 characters.`,
  form: (line: number, typed: string) => `Line ${line}: “${typed}” is no form. Write boards, kit or built.`,
  twice: (line: number, serial: string) => `Line ${line}: ${serial} stands in the list already.`,
  known: (line: number, serial: string) =>
    `Line ${line}: there is a unit ${serial} in this workshop already.`,
  notSold: (line: number) => `Line ${line}: this run does not sell this form.`,
}

/** The owner's page of finished units. */
export const unitWords = {
  title: 'Units',
  lead: 'What is built and has passed its test, by serial number. Packers scan these numbers.',
  caption: 'Units of this run, by serial number',
  serial: 'Serial number',
  offer: 'Form',
  state: 'State',
  order: 'Order',
  empty: 'No unit is entered. Orders are packed without serial numbers until the first one is.',
  add: 'Enter finished units',
  serials: 'Serial numbers',
  hint: 'One a line, scanned or pasted. From a table: the number, a semicolon, and boards, kit or built.',
  form: 'Form of the lines that name none',
  button: 'Enter these units',
  csv: 'Units as CSV',
  states: {
    started: 'begun',
    rework: 'being mended',
    passed: 'free',
    allocated: 'packed',
    posted: 'posted',
    returned: 'came back',
    scrapped: 'given up',
  },
}
