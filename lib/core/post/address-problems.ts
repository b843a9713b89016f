import { ADDRESS_COUNTRIES } from '@/lib/core/data/address-countries'
import { ADDRESS_FORMATS } from '@/lib/core/data/address-formats'
import { ADDRESS_POSTCODES } from '@/lib/core/data/address-postcodes'
import { isLatin } from '@/lib/core/post/latin'
import { CUSTOMS_ASKS, REQUIRED_FIELDS } from '@/lib/core/post/required-fields'

/** What an address needs to be looked at; `Address` of address.ts fits. */
type Checked = {
  readonly country: string
  readonly name: string
  readonly organization?: string
  readonly lines: readonly string[]
  readonly city?: string
  readonly region?: string
  readonly postcode?: string
  readonly phone?: string
  readonly taxNumber?: string
  readonly latin?: {
    readonly name: string
    readonly lines: readonly string[]
    readonly city?: string
    readonly region?: string
  }
}

/**
 * One thing about an address: 'error' must be mended before it is taken, 'ask' is a question a person may wave away.
 * missing: the part is needed; usually_given: addresses there mostly have it; not_a_country: no ISO 3166-1 code;
 * unusual_form: postcodes there mostly look otherwise; customs_asks: customs of the destination want to know it;
 * latin_missing: the part is in another script and has no Latin version; not_latin: the Latin version has other letters.
 */
export type AddressProblem = {
  readonly field: string
  readonly problem:
    | 'missing'
    | 'usually_given'
    | 'not_a_country'
    | 'unusual_form'
    | 'customs_asks'
    | 'latin_missing'
    | 'not_latin'
  readonly severity: 'error' | 'ask'
}

const FIELD = { L: 'lines', C: 'city', S: 'region', Z: 'postcode' } as const

/**
 * What is missing or odd about an address, worst first. It never refuses by guess: only the addressee, a country that
 * exists and the parts the forty priced destinations are known to need are errors; every other finding is a question.
 * Domain:   any address of strings. Empty list: nothing to say.
 * Source:   needed parts in required-fields.ts (hand-kept, libaddressinput); form of postcodes from npm package
 *           postcode-validator, used for questions only.
 * Cost:     about a microsecond each.
 * @example  addressProblems({ country: 'DE', name: 'A. Berg', lines: ['Hof 1'], city: 'Ulm' })  // → [{ field: 'postcode', problem: 'missing', severity: 'error' }]
 * @example  addressProblems({ country: 'IE', name: 'A. Byrne', lines: ['1 Quay St'], city: 'Sligo' })  // → []
 */
export function addressProblems(address: Checked): AddressProblem[] {
  const country = address.country.trim().toUpperCase()
  const known = Object.hasOwn(ADDRESS_COUNTRIES, country)
  const found: AddressProblem[] = known ? [] : [error('country', 'not_a_country')]
  if (isBlank(address.name) && isBlank(address.organization)) found.push(error('name', 'missing'))
  found.push(...missingParts(address, country))
  if (known) found.push(...postcodeQuestion(address.postcode, country))
  for (const field of CUSTOMS_ASKS[country] ?? []) {
    if (isBlank(address[field])) found.push(ask(field, 'customs_asks'))
  }
  found.push(...latinQuestions(address))
  return found.sort((a, b) => Number(a.severity === 'ask') - Number(b.severity === 'ask'))
}

function missingParts(address: Checked, country: string): AddressProblem[] {
  const rule = REQUIRED_FIELDS[country]
  const layout = ADDRESS_FORMATS[country]?.own ?? ''
  const needed = rule?.needed ?? ''
  const usual =
    rule?.usual ?? `L${layout.includes('%C') || layout === '' ? 'C' : ''}${layout.includes('%Z') ? 'Z' : ''}`
  const absent = (letter: string) => {
    const value = address[FIELD[letter as keyof typeof FIELD]]
    return typeof value === 'object' ? value.every(isBlank) : isBlank(value)
  }
  return [
    ...[...needed].filter(absent).map((letter) => error(FIELD[letter as keyof typeof FIELD], 'missing')),
    ...[...usual].filter(absent).map((letter) => ask(FIELD[letter as keyof typeof FIELD], 'usually_given')),
  ]
}

function postcodeQuestion(postcode: string | undefined, country: string): AddressProblem[] {
  const pattern = patternOf(country)
  if (isBlank(postcode) || pattern === undefined) return []
  const plain = postcode!
    .normalize('NFKC')
    .replace(/[‐-―−]/g, '-')
    .trim()
    .toUpperCase()
  const forms = [
    plain,
    plain.replace(/\s+/g, ''),
    plain.replace(/[\s-]+/g, ''),
    plain.replace(/^[A-Z]{1,2}[- ]+(?=\d)/, ''),
  ]
  // Japanese and Polish codes are often typed without the hyphen, others with a space too many.
  const spaced = forms.concat(
    forms[2]!.replace(/^(\d{3})(\d{4})$/, '$1-$2'),
    forms[2]!.replace(/^(\d{2})(\d{3})$/, '$1-$2'),
  )
  return spaced.some((form) => pattern.test(form)) ? [] : [ask('postcode', 'unusual_form')]
}

const patterns = new Map<string, RegExp>()

function patternOf(country: string): RegExp | undefined {
  const source = ADDRESS_POSTCODES[country]
  if (source === undefined) return undefined
  const pattern = patterns.get(country) ?? new RegExp(source)
  patterns.set(country, pattern)
  return pattern
}

function latinQuestions({ name, lines, city, region, latin }: Checked): AddressProblem[] {
  if (latin === undefined) {
    return isLatin([name, ...lines, city, region].join('')) ? [] : [ask('latin', 'latin_missing')]
  }
  const found: AddressProblem[] = []
  if (isBlank(latin.name) && !isLatin(name)) found.push(ask('latin.name', 'latin_missing'))
  if (latin.lines.every(isBlank) && !isLatin(lines.join(''))) found.push(ask('latin.lines', 'latin_missing'))
  for (const field of ['city', 'region'] as const) {
    const own = field === 'city' ? city : region
    if (isBlank(latin[field]) && !isLatin(own ?? '')) found.push(ask(`latin.${field}`, 'latin_missing'))
    if (!isLatin(latin[field] ?? '')) found.push(ask(`latin.${field}`, 'not_latin'))
  }
  if (!isLatin(latin.name)) found.push(ask('latin.name', 'not_latin'))
  if (!isLatin(latin.lines.join(''))) found.push(ask('latin.lines', 'not_latin'))
  return found
}

function isBlank(text: string | undefined | null): boolean {
  return (text ?? '').trim() === ''
}

function error(field: string, problem: AddressProblem['problem']): AddressProblem {
  return { field, problem, severity: 'error' }
}

function ask(field: string, problem: AddressProblem['problem']): AddressProblem {
  return { field, problem, severity: 'ask' }
}
