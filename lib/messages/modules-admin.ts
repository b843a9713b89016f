/** A workshop's modules at its desk. */
export const modulesAdminWords = {
  cautionsBeginning: [
    'Building needs a hot soldering iron: burns and fumes. Work where there is fresh air, protect your eyes, and wash your hands after handling solder that holds lead.',
    'Turn the power header the right way round before you switch on: the stripe is −12 V. A reversed header can destroy this module and others.',
    'There is no mains voltage inside. Use it only in a case with a power supply made for it.',
    'If you are unsure, get help from somebody who has built one before.',
  ].join('\n\n'),
} as const
