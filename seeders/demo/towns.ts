import type { AddressInput } from '@/lib/contracts/address'

type Town = Omit<AddressInput, 'name' | 'country' | 'lines'> & { street: string; latinStreet?: string }

/** How often somebody of the demo lives where. */
export const COUNTRY_WEIGHTS: readonly (readonly [string, number])[] = [
  ['DE', 32],
  ['US', 20],
  ['GB', 13],
  ['FR', 8],
  ['NL', 7],
  ['AT', 5],
  ['CA', 4],
  ['SE', 3],
  ['AU', 3],
  ['CH', 3],
  ['JP', 2],
]

/** Streets that do not exist in towns that do, written as each country writes them. */
export const TOWNS: Readonly<Record<string, readonly Town[]>> = {
  DE: [
    { street: 'Ahornsteg', postcode: '20457', city: 'Hamburg' },
    { street: 'Lindenhof', postcode: '89073', city: 'Ulm' },
    { street: 'Am Speicher', postcode: '04109', city: 'Leipzig' },
    { street: 'Kranichweg', postcode: '50667', city: 'Köln' },
  ],
  US: [
    { street: 'Juniper Landing', postcode: '97205', city: 'Portland', region: 'OR' },
    { street: 'Mill Row', postcode: '12401', city: 'Kingston', region: 'NY' },
    { street: 'Cedar Gate', postcode: '78702', city: 'Austin', region: 'TX' },
  ],
  GB: [
    { street: 'Tanner Row', postcode: 'LS1 4AP', city: 'Leeds' },
    { street: 'Quarry Hill Lane', postcode: 'BS1 5TR', city: 'Bristol' },
  ],
  FR: [
    { street: 'rue du Vieux Phare', postcode: '44000', city: 'Nantes' },
    { street: 'allée des Tilleuls', postcode: '69002', city: 'Lyon' },
  ],
  NL: [
    { street: 'Molenkade', postcode: '3511 AX', city: 'Utrecht' },
    { street: 'Zuiderpad', postcode: '9711 LM', city: 'Groningen' },
  ],
  AT: [{ street: 'Nussgasse', postcode: '8010', city: 'Graz' }],
  CA: [{ street: 'Harbour Steps', postcode: 'B3H 1X5', city: 'Halifax', region: 'NS' }],
  SE: [{ street: 'Björkgränden', postcode: '411 05', city: 'Göteborg' }],
  AU: [{ street: 'Banksia Row', postcode: '3000', city: 'Melbourne', region: 'VIC' }],
  CH: [{ street: 'Rebhalde', postcode: '8001', city: 'Zürich' }],
  JP: [
    {
      street: '本町',
      latinStreet: 'Honcho',
      postcode: '105-0001',
      city: '港区',
      region: '東京都',
      phone: '+81 3 5550 0142',
      latin: { name: '', lines: [''], city: 'Minato-ku', region: 'Tokyo' },
    },
  ],
}

/** Names as they are common there; nobody of these is anybody. */
export const NAMES: Readonly<Record<string, { first: readonly string[]; last: readonly string[] }>> = {
  DE: {
    first: ['Ines', 'Jonte', 'Marit', 'Arne', 'Levke', 'Bastian', 'Frauke', 'Tilo', 'Swantje', 'Enno'],
    last: ['Sommerfeld', 'Ahlers', 'Brandhuber', 'Kessling', 'Rautenberg', 'Vosskamp', 'Zeidler'],
  },
  US: {
    first: ['Dana', 'Marcus', 'Wren', 'Theo', 'Noelle', 'Cal', 'Imani', 'Reggie', 'June', 'Otis'],
    last: ['Ashworth', 'Bellamy', 'Crane', 'Delgado', 'Easterly', 'Fontaine', 'Haldane'],
  },
  GB: {
    first: ['Tom', 'Bronwen', 'Callum', 'Edie', 'Rory', 'Saskia', 'Piers'],
    last: ['Ashby', 'Brindle', 'Cotterill', 'Dunmore', 'Oakeshott'],
  },
  FR: { first: ['Maëlle', 'Yann', 'Solène', 'Bastien', 'Ophélie'], last: ['Carrel', 'Dufresne', 'Lemoine'] },
  NL: { first: ['Femke', 'Joost', 'Sanne', 'Wessel'], last: ['Brouwers', 'de Ruiter', 'Hoekstra'] },
  AT: { first: ['Lukas', 'Theresa', 'Valentin'], last: ['Gruberbauer', 'Steinlechner'] },
  CA: { first: ['Maeve', 'Luc', 'Hollis'], last: ['Tremaine', 'MacAllan'] },
  SE: { first: ['Åsa', 'Torbjörn', 'Elin'], last: ['Lindqvist', 'Norrby'] },
  AU: { first: ['Billie', 'Lachlan', 'Matilda'], last: ['Hargrave', 'Quinlan'] },
  CH: { first: ['Reto', 'Ladina', 'Urs'], last: ['Amstutz', 'Zgraggen'] },
  JP: { first: ['花', '健', '美咲'], last: ['森', '小川'] },
}

/** The Japanese names in Latin letters, for the label the post of the sender reads. */
export const LATIN_NAMES: Readonly<Record<string, string>> = {
  花: 'Hana',
  健: 'Ken',
  美咲: 'Misaki',
  森: 'Mori',
  小川: 'Ogawa',
}
