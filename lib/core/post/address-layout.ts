/** The parts a layout can place: name, organization, lines, city, region and postcode, by their letter. */
export type LaidParts = Readonly<Record<'N' | 'O' | 'A' | 'C' | 'S' | 'Z', string>>

/** For countries the data set does not describe: everything given is printed. */
const DEFAULT_LAYOUT = '%N%n%O%n%A%n%C %Z%n%S'

/**
 * Prints the parts of an address in the order of a layout, one entry per line; empty parts take their separators along.
 * A city or postcode the layout has no place for is printed beside the lines, so that nothing given is lost; a region
 * it has no place for is left out, as the posts of those countries want it.
 * Domain:  a layout of %-letters as in lib/core/data/address-formats.ts; undefined for a country without one.
 * @example layOut('%N%n%A%n%Z %C', { N: 'A. Berg', O: '', A: 'Hof 1', C: 'Ulm', S: '', Z: '89073' })  // → ['A. Berg', 'Hof 1', '89073 Ulm']
 */
export function layOut(layout: string = DEFAULT_LAYOUT, parts: LaidParts): string[] {
  return withPlaces(layout, parts)
    .split('%n')
    .flatMap((line) => layOutLine(line, parts).split('\n'))
    .map((line) => line.trim())
    .filter((line) => line !== '')
}

function withPlaces(layout: string, { C: city, Z: postcode }: LaidParts): string {
  const words = layout.replace(/%[A-Zn]/g, ' ').toUpperCase()
  // Japanese, Chinese and Korean addresses run from the largest to the smallest: there the city precedes the lines.
  const largestFirst = layout.indexOf('%A') < layout.indexOf('%N')
  let result = layout
  if (city !== '' && !layout.includes('%C') && !words.includes(city.toUpperCase())) {
    if (largestFirst && layout.includes('%S')) result = result.replace('%S', '%S%C')
    else if (largestFirst) result = result.replace('%A', '%C%n%A')
    else result = layout.includes('%A, %S') ? result.replace('%A', '%A, %C') : result.replace('%A', '%A%n%C')
  }
  if (postcode !== '' && !layout.includes('%Z')) {
    result = result.includes('%C') ? result.replace('%C', '%C %Z') : `${result}%n%Z`
  }
  return result
}

function layOutLine(line: string, parts: LaidParts): string {
  let printed = ''
  let separator: string | undefined
  let skipped = false
  for (const token of line.match(/%[A-Z]|[^%]+/g) ?? []) {
    if (!token.startsWith('%')) {
      if (!skipped || printed !== '') separator ??= token
      continue
    }
    const value = parts[token[1] as keyof LaidParts] ?? ''
    if (value === '') {
      // A prefix such as "CH-" goes with its postcode; a place name such as "SINGAPORE " stays.
      if (printed === '' && separator !== undefined && isPlace(separator)) printed = separator.trim()
      if (printed === '' || isPlace(separator ?? '')) separator = undefined
      skipped = true
      continue
    }
    printed += withoutRepeated(separator ?? '', value) + value
    separator = undefined
  }
  return printed === '' && separator !== undefined && isPlace(separator) ? separator : printed
}

function isPlace(literal: string): boolean {
  return literal.trim().length >= 4
}

/** "SE-114 55" already carries the prefix that the layout would put before it. */
function withoutRepeated(separator: string, value: string): string {
  const prefix = separator.trim()
  return prefix !== '' && value.toUpperCase().startsWith(prefix.toUpperCase())
    ? separator.replace(prefix, '')
    : separator
}
