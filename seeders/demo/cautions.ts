/** What every page of the demo says before anybody orders. */
export const CAUTIONS = [
  'A soldering iron burns. Solder where air moves, wash your hands afterwards, wear glasses when you cut leads.',
  'Turn the rack off before you plug anything in, and look twice that the red stripe of the cable lies at −12 V.',
  'No mains inside: use a rack supply that is sold as one. Get help if you are unsure.',
].join('\n')
