import { readFileSync, writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { fileURLToPath } from 'node:url'

/** The day the packages below were read; raise it together with them. */
const READ_ON = '2026-12-01'

const require = createRequire(import.meta.url)

/** Names as a post office prints them, where the package's are inverted, long or not ours to use. */
const PLAIN_NAMES: Readonly<Record<string, string>> = {
  CD: 'Democratic Republic of the Congo',
  CG: 'Republic of the Congo',
  CI: "Côte d'Ivoire",
  CN: 'China',
  FK: 'Falkland Islands',
  FM: 'Micronesia',
  GM: 'Gambia',
  IR: 'Iran',
  LA: 'Laos',
  MD: 'Moldova',
  MF: 'Saint Martin',
  MK: 'North Macedonia',
  PS: 'Palestine',
  RE: 'Réunion',
  SX: 'Sint Maarten',
  SY: 'Syria',
  TW: 'Taiwan',
  TZ: 'Tanzania',
  VA: 'Vatican City',
  VG: 'British Virgin Islands',
  VI: 'Virgin Islands of the United States',
}

/** The three address files of lib/core/data as text, by file name. */
export function addressFiles(): Readonly<Record<string, string>> {
  return {
    'address-countries.ts': file('i18n-iso-countries', countryNames(), {
      name: 'ADDRESS_COUNTRIES',
      type: 'string',
      about:
        'English names of the ISO 3166-1 alpha-2 countries (and XK), as printed under a foreign address.',
    }),
    'address-formats.ts': file('localized-address-format', addressFormats(), {
      name: 'ADDRESS_FORMATS',
      type: '{ readonly own: string; readonly latin?: string }',
      about:
        "Order of an address by destination: %N name, %O organization, %A lines, %D district, %C city, %S region,\n * %Z postcode, %X sorting code, %n new line. `own` is the country's own script, `latin` the Latin one if it differs.",
    }),
    'address-postcodes.ts': file('postcode-validator', postcodes(), {
      name: 'ADDRESS_POSTCODES',
      type: 'string',
      about:
        'What postcodes look like, as sources of regular expressions on upper-case text. To ask by, never to refuse by.',
    }),
  }
}

function file(
  source: string,
  entries: readonly (readonly [string, string])[],
  { name, type, about }: { name: string; type: string; about: string },
): string {
  const { version, license } = JSON.parse(readFileSync(packageFile(source, 'package.json'), 'utf8'))
  const rows = [...entries].sort(([a], [b]) => (a < b ? -1 : 1)).map(([key, value]) => `  ${key}: ${value},`)
  return [
    `// Made by scripts/data/address.ts from ${source} ${version} (${license}), read on ${READ_ON}. Do not edit.`,
    '',
    `/**\n * ${about}\n * Source: npm package ${source} ${version}.\n */`,
    `export const ${name}: Readonly<Record<string, ${type}>> = {`,
    ...rows,
    '}',
    '',
  ].join('\n')
}

function countryNames() {
  const names: Record<string, string | string[]> = JSON.parse(
    readFileSync(packageFile('i18n-iso-countries', 'langs/en.json'), 'utf8'),
  ).countries
  return Object.entries(names).map(([code, given]) => {
    const name = PLAIN_NAMES[code] ?? (Array.isArray(given) ? given[0] : given)
    return [code, quote(String(name))] as const
  })
}

function addressFormats() {
  const text = readFileSync(packageFile('localized-address-format', 'dist/index.esm.js'), 'utf8')
  const row = /\['([A-Z]{2})', \{ local: '([^']*)'(?:, latin: '([^']*)')? \}\]/g
  return [...text.matchAll(row)].map(([, code, own, latin]) => {
    const value =
      latin === undefined ? `{ own: ${quote(own!)} }` : `{ own: ${quote(own!)}, latin: ${quote(latin)} }`
    return [code!, value] as const
  })
}

/** Countries that no longer exist, aliases and catch-alls of the package. */
const NOT_COUNTRIES = new Set(['CS', 'YU', 'UK', 'INTL'])

function postcodes() {
  const { POSTCODE_REGEXES } = require(packageFile('postcode-validator', 'lib/cjs/postcode-regexes.js')) as {
    POSTCODE_REGEXES: Map<string, RegExp>
  }
  return [...POSTCODE_REGEXES]
    .filter(([code]) => !NOT_COUNTRIES.has(code))
    .map(([code, pattern]) => [code, quote(pattern.source)] as const)
}

function quote(text: string): string {
  const escaped = text.replaceAll('\\', '\\\\')
  return escaped.includes("'") ? `"${escaped.replaceAll('"', '\\"')}"` : `'${escaped}'`
}

function packageFile(name: string, path: string): string {
  return fileURLToPath(new URL(`../../node_modules/${name}/${path}`, import.meta.url))
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  for (const [name, text] of Object.entries(addressFiles())) {
    writeFileSync(new URL(`../../lib/core/data/${name}`, import.meta.url), text)
  }
}
