import { ADDRESS_COUNTRIES } from '@/lib/core/data/address-countries'
import { ADDRESS_FORMATS } from '@/lib/core/data/address-formats'
import { layOut } from '@/lib/core/post/address-layout'
import { isLatin } from '@/lib/core/post/latin'

/** The part of an address that may be written in two scripts. */
export type AddressWords = {
  /** The person it is for. */
  readonly name: string
  readonly organization?: string
  /** Street, house number, flat: one entry per printed line, in the order they are printed. */
  readonly lines: readonly string[]
  /** Town or city; in Japan the city, ward or county. */
  readonly city?: string
  /** State, prefecture, province or county, as people there write it (US: 'OR'; JP: '東京都'). */
  readonly region?: string
}

/**
 * A postal address. The main fields are in the buyer's own script; `latin` is the same address in Latin letters, which
 * the post of the country it is sent from needs where the main fields are in another script.
 */
export type Address = AddressWords & {
  /** ISO 3166-1 alpha-2. */
  readonly country: string
  readonly postcode?: string
  /** With country code, as the carrier wants it. */
  readonly phone?: string
  /** The addressee's number where customs ask for one (BR, KR, TR …). */
  readonly taxNumber?: string
  readonly latin?: AddressWords
}

/** Whose name stands on the last line where the addressed place belongs to another country's post. */
const POST_OF: Readonly<Record<string, string>> = { AX: 'FI', GG: 'GB', IM: 'GB', JE: 'GB' }

/**
 * The lines of a label, in the order the destination's own post wants, with the country in capitals at the end.
 * Units:    script: 'own' prints the buyer's own script, 'latin' the Latin version (the main fields where none was
 *           given); from: country posted from, ISO 3166-1 alpha-2.
 * Domain:   any address, complete or not: nothing is refused, empty parts leave no gap. A country that is not in
 *           ISO 3166-1 is printed as it stands.
 * Note:     parts written in Latin letters are laid out in the Latin order even where 'own' is asked. The country line is
 *           English, which posts everywhere read (UPU S42 wants a language known in the country of posting), and is left
 *           out when the parcel stays in its country.
 * Source:   order of lines from npm package localized-address-format (libaddressinput); see address-layout.ts for the
 *           parts it has no place for.
 * @example  formatAddress({ country: 'DE', name: 'A. Berg', lines: ['Hof 1'], postcode: '89073', city: 'Ulm' }, { script: 'own', from: 'FR' })  // → ['A. Berg', 'Hof 1', '89073 Ulm', 'GERMANY']
 * @example  formatAddress({ country: 'JP', name: '森 花', lines: ['本町1-2'], city: '港区', region: '東京都', postcode: '105-0001' }, { script: 'own', from: 'JP' })  // → ['〒105-0001', '東京都港区', '本町1-2', '森 花']
 */
export function formatAddress(
  address: Address,
  { script, from }: { readonly script: 'own' | 'latin'; readonly from: string },
): string[] {
  const country = address.country.trim().toUpperCase()
  const words = script === 'latin' ? latinWords(address) : address
  const parts = {
    N: tidy(words.name),
    O: tidy(words.organization),
    A: words.lines.map(tidy).filter(Boolean).join('\n'),
    C: tidy(words.city),
    S: tidy(words.region),
    Z: tidy(address.postcode),
  }
  const format = ADDRESS_FORMATS[country]
  const own = !isLatin(`${parts.N}${parts.O}${parts.A}${parts.C}${parts.S}`)
  const lines = layOut(own ? format?.own : (format?.latin ?? format?.own), parts)
  const post = POST_OF[country] ?? country
  const sender = from.trim().toUpperCase()
  if (post === (POST_OF[sender] ?? sender)) return lines
  return [...lines, (ADDRESS_COUNTRIES[post] ?? address.country).toUpperCase()]
}

/** The Latin version, with parts it leaves out taken from the main fields where those can be read. */
function latinWords(address: Address): AddressWords {
  const { latin } = address
  if (latin === undefined) return address
  const readable = (text: string | undefined) => (text !== undefined && isLatin(text) ? text : undefined)
  return {
    name: latin.name.trim() === '' ? address.name : latin.name,
    organization: latin.organization ?? readable(address.organization),
    lines: latin.lines.some((line) => line.trim() !== '') ? latin.lines : address.lines,
    city: latin.city ?? readable(address.city),
    region: latin.region ?? readable(address.region),
  }
}

function tidy(text: string | undefined | null): string {
  return (text ?? '').replace(/\s+/g, ' ').trim()
}

export { addressProblems, type AddressProblem } from '@/lib/core/post/address-problems'
