import { isCountry } from '@/lib/core/data/country'
import { crossesCustoms } from '@/lib/core/post/customs-territory'
import { isLatin } from '@/lib/core/post/latin'
import { isVague } from '@/lib/core/post/vague-words'

/** Sender or addressee as the declaration names them. */
type Party = {
  readonly country: string
  readonly postcode?: string
  readonly name: string
  readonly lines: readonly string[]
  readonly phone?: string
  readonly email?: string
}

/** Everything a customs form says of a parcel, as far as it is known. */
export type Declaration = {
  /** eori: the sender's customs number, where its country gives one. */
  readonly from: Party & { readonly eori?: string }
  /** taxNumber: the addressee's number, where the destination's customs ask for one. */
  readonly to: Party & { readonly taxNumber?: string }
  readonly contents?: 'sale' | 'gift' | 'sample' | 'returned' | 'documents' | 'other'
  /** ISO 4217, of every value. */
  readonly currency?: string
  readonly lines: readonly {
    readonly description?: string
    readonly quantity?: number
    /** Of all pieces together, minor units. */
    readonly value?: number
    /** Net, of all pieces together. */
    readonly grams?: number
    readonly code?: string
    readonly origin?: string
    /** Names the kit this line belongs to, if one kit has been declared in several lines. */
    readonly kit?: string
  }[]
  /** Gross: contents and packing. */
  readonly grossGrams?: number
  /** Who signs, and when ('YYYY-MM-DD'). */
  readonly signedBy?: string
  readonly signedOn?: string
  /** Number of the invoice in the parcel. */
  readonly invoice?: string
}

/**
 * One thing a customs form lacks or that customs would stop: 'error' must be mended, 'ask' should be looked at.
 * missing; too_vague: the description fits any parcel; zero: a value, weight or count of nothing; code_digits: fewer digits
 * than the destination wants; not_a_country; one_code_per_kit: a kit is declared as what it makes, under one code;
 * heavier_than_gross: the contents weigh more than the parcel; not_latin; called_gift: goods that were paid for.
 */
export type DeclarationProblem = {
  readonly field: string
  readonly problem:
    | 'missing'
    | 'too_vague'
    | 'zero'
    | 'code_digits'
    | 'not_a_country'
    | 'one_code_per_kit'
    | 'heavier_than_gross'
    | 'not_latin'
    | 'called_gift'
  readonly severity: 'error' | 'ask'
}

/**
 * Digits of the customs code a destination wants of postal goods; six elsewhere (the international part).
 * Source: US postal entry with a ten-digit code from 24 July 2026 (check-values, to be re-checked).
 */
const CODE_DIGITS: Readonly<Record<string, number>> = { US: 10, PR: 10 }

/**
 * What a parcel's customs declaration still lacks, each missing datum by its field, worst first. Empty when the parcel does
 * not cross a customs border.
 * Source:   fields of the forms CN 22 and CN 23 (UPU Convention Regulations); severities are our own rule: what the form
 *           demands is an error, what speeds clearance is asked for.
 * @example  declarationProblems({ from: { country: 'DE', name: 'A', lines: ['B'] }, to: { country: 'FR', name: 'C', lines: ['D'] }, lines: [] })  // → []
 */
export function declarationProblems(parcel: Declaration): DeclarationProblem[] {
  if (!crossesCustoms(parcel.from, parcel.to)) return []
  const found = [
    ...partyProblems('from', parcel.from),
    ...partyProblems('to', parcel.to),
    ...whenBlank('contents', parcel.contents),
    ...whenBlank('currency', parcel.currency),
    ...whenBlank('signedBy', parcel.signedBy),
    ...whenBlank('signedOn', parcel.signedOn),
    ...whenBlank('from.eori', parcel.from.eori, 'ask'),
    ...whenBlank('invoice', parcel.invoice, 'ask'),
    ...(parcel.contents === 'gift' ? [error('contents', 'called_gift')] : []),
    ...(parcel.lines.length === 0 ? [error('lines', 'missing')] : []),
    ...parcel.lines.flatMap((line, i) => lineProblems(`lines.${i}`, line, parcel.to.country)),
    ...kitProblems(parcel),
    ...weightProblems(parcel),
  ]
  return found.sort((a, b) => Number(a.severity === 'ask') - Number(b.severity === 'ask'))
}

function partyProblems(side: string, { name, lines, country, phone, email }: Party): DeclarationProblem[] {
  const isReachable = !isBlank(phone) || !isBlank(email)
  return [
    ...whenBlank(`${side}.name`, name),
    ...whenBlank(`${side}.lines`, lines.join('')),
    ...(isCountry(country.toUpperCase()) || country.toUpperCase() === 'XK'
      ? []
      : [error(`${side}.country`, 'not_a_country')]),
    ...(isReachable ? [] : [ask(`${side}.phone`, 'missing')]),
    ...(isLatin(name + lines.join('')) ? [] : [ask(`${side}.lines`, 'not_latin')]),
  ]
}

function lineProblems(
  at: string,
  line: Declaration['lines'][number],
  destination: string,
): DeclarationProblem[] {
  const { description = '', code = '', origin = '' } = line
  const digits = code.replace(/[\s.]/g, '')
  const wanted = CODE_DIGITS[destination.toUpperCase()] ?? 6
  return [
    ...whenBlank(`${at}.description`, description),
    ...(!isBlank(description) && isVague(description) ? [error(`${at}.description`, 'too_vague')] : []),
    ...(isLatin(description) ? [] : [ask(`${at}.description`, 'not_latin')]),
    ...whenNothing(`${at}.quantity`, line.quantity),
    ...whenNothing(`${at}.value`, line.value),
    ...whenNothing(`${at}.grams`, line.grams),
    ...whenBlank(`${at}.code`, code),
    ...(isBlank(code) || (/^[0-9]{6,12}$/.test(digits) && digits.length >= wanted)
      ? []
      : [error(`${at}.code`, 'code_digits')]),
    ...whenBlank(`${at}.origin`, origin),
    ...(isBlank(origin) || isCountry(origin) ? [] : [error(`${at}.origin`, 'not_a_country')]),
  ]
}

function kitProblems({ lines }: Declaration): DeclarationProblem[] {
  return lines.flatMap(({ kit }, i) =>
    kit !== undefined && lines.findIndex((line) => line.kit === kit) < i
      ? [error(`lines.${i}.code`, 'one_code_per_kit')]
      : [],
  )
}

function weightProblems({ lines, grossGrams }: Declaration): DeclarationProblem[] {
  const net = lines.reduce((sum, { grams = 0 }) => sum + grams, 0)
  const missing = whenNothing('grossGrams', grossGrams)
  return missing.length === 0 && net > grossGrams! ? [error('grossGrams', 'heavier_than_gross')] : missing
}

function whenBlank(
  field: string,
  text: string | undefined,
  severity: 'error' | 'ask' = 'error',
): DeclarationProblem[] {
  return isBlank(text) ? [{ field, problem: 'missing', severity }] : []
}

function whenNothing(field: string, amount: number | undefined): DeclarationProblem[] {
  if (amount === undefined) return [error(field, 'missing')]
  return amount > 0 ? [] : [error(field, 'zero')]
}

function isBlank(text: string | undefined): boolean {
  return (text ?? '').trim() === ''
}

function error(field: string, problem: DeclarationProblem['problem']): DeclarationProblem {
  return { field, problem, severity: 'error' }
}

function ask(field: string, problem: DeclarationProblem['problem']): DeclarationProblem {
  return { field, problem, severity: 'ask' }
}
