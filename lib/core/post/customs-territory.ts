import { isEuMember } from '@/lib/core/data/eu-members'

/** One end of a parcel's way. */
export type PostPlace = { readonly country: string; readonly postcode?: string }

/** Places that form one customs and tax area with another country; members of the European Union are 'EU'. */
const AREA: Readonly<Record<string, string>> = { IM: 'GB', LI: 'CH', MC: 'EU', PR: 'US' }

/** Postcodes that lie outside the area of their country, by the start of the code; the first that fits counts. */
const ZONES: Readonly<Record<string, readonly (readonly [start: string, area: string])[]>> = {
  AU: [
    ['2899', 'NF'],
    ['6798', 'CX'],
    ['6799', 'CC'],
  ],
  DE: [
    ['27498', 'DE-HELGOLAND'],
    ['78266', 'CH'],
  ],
  DK: [['39', 'GL']],
  ES: [
    ['35', 'ES-CANARIES'],
    ['38', 'ES-CANARIES'],
    ['51', 'ES-CEUTA'],
    ['52', 'ES-MELILLA'],
  ],
  FI: [['22', 'AX']],
  FR: [
    ['97133', 'BL'],
    ['97150', 'MF'],
    ['971', 'GP'],
    ['972', 'MQ'],
    ['973', 'GF'],
    ['974', 'RE'],
    ['975', 'PM'],
    ['976', 'YT'],
    ['986', 'WF'],
    ['987', 'PF'],
    ['988', 'NC'],
  ],
  GB: [
    ['BT', 'GB-NORTHERN-IRELAND'],
    ['GY', 'GG'],
    ['JE', 'JE'],
  ],
  GR: [['63086', 'GR-ATHOS']],
  IT: [
    ['22061', 'IT-CAMPIONE'],
    ['23041', 'IT-LIVIGNO'],
  ],
  NO: [['917', 'SJ']],
  US: [
    ...['006', '007', '009'].map((start) => [start, 'US'] as const),
    ['008', 'VI'],
    ['96799', 'AS'],
    ['9691', 'GU'],
    ['9692', 'GU'],
    ['9693', 'GU'],
    ['9695', 'MP'],
    ...[
      '090',
      '091',
      '092',
      '093',
      '094',
      '095',
      '096',
      '097',
      '098',
      '340',
      '962',
      '963',
      '964',
      '965',
      '966',
    ].map((start) => [start, 'US-MILITARY'] as const),
  ],
}

/** Areas between which goods go without papers although they are not one. */
const OPEN: readonly (readonly [string, string])[] = [
  ['GB-NORTHERN-IRELAND', 'EU'],
  ['GB-NORTHERN-IRELAND', 'GB'],
]

/**
 * The customs and tax area a place lies in: 'EU', a country, or a zone of its own.
 * A postcode typed with its country's prefix or with spaces is understood; without one the main part is meant.
 * Source:   from memory, to be re-checked: EU customs code art. 4 and VAT directive art. 6 (Canaries, Ceuta, Melilla, Åland,
 *           Helgoland, Büsingen, Livigno, Campione, Athos, French overseas); Monaco with France; Northern Ireland by the
 *           Windsor Framework; Man with GB; Liechtenstein with CH; US military and Pacific postcodes by the post's own list.
 * @example  customsArea({ country: 'ES', postcode: '38001' })  // → 'ES-CANARIES'
 * @example  customsArea({ country: 'AT' })  // → 'EU'
 */
export function customsArea({ country, postcode = '' }: PostPlace): string {
  const code = country.trim().toUpperCase()
  const plain = postcode.toUpperCase().replace(/[\s-]/g, '')
  const typed = plain.startsWith(code) && code !== 'GB' ? plain.slice(code.length) : plain
  const zone = ZONES[code]?.find(
    ([start]) => typed.startsWith(start) && (code !== 'GB' || /^[A-Z]{2}\d/.test(typed)),
  )
  return zone?.[1] ?? AREA[code] ?? (isEuMember(code) ? 'EU' : code)
}

/**
 * Whether goods posted from one place to another pass a customs border, for which the post wants a declaration.
 * @example  crossesCustoms({ country: 'FR' }, { country: 'MC' })  // → false
 * @example  crossesCustoms({ country: 'FI' }, { country: 'FI', postcode: '22100' })  // → true
 */
export function crossesCustoms(from: PostPlace, to: PostPlace): boolean {
  const [a, b] = [customsArea(from), customsArea(to)]
  return a !== b && !OPEN.some((pair) => pair.includes(a) && pair.includes(b))
}
