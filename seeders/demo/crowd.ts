import type { AddressInput } from '@/lib/contracts/address'
import { chanceOf, type Chance } from './chance'
import { COUNTRY_WEIGHTS, LATIN_NAMES, NAMES, TOWNS } from './towns'

/** Somebody who might buy. */
export type Buyer = { email: string; name: string; country: string; address: AddressInput }

/** As many people as asked for, the same ones for the same seed, each with an address of their own. */
export function crowd(seed: number, count: number, countries = COUNTRY_WEIGHTS): Buyer[] {
  const chance = chanceOf(seed)
  const taken = new Set<string>()
  return Array.from({ length: count }, () => someone(chance, countries, taken))
}

function someone(chance: Chance, countries: typeof COUNTRY_WEIGHTS, taken: Set<string>): Buyer {
  const country = chance.weighted(countries)
  const names = NAMES[country]!
  const [first, last] = [chance.pick(names.first), chance.pick(names.last)]
  const latin = [LATIN_NAMES[first] ?? first, LATIN_NAMES[last] ?? last] as const
  const mailName = latin
    .join('.')
    .toLowerCase()
    .normalize('NFD')
    .replaceAll(/[^a-z.]/g, '')
  let email = `${mailName}@post.brimline.example`
  for (let n = 2; taken.has(email); n += 1) email = `${mailName}.${n}@post.brimline.example`
  taken.add(email)
  const name = country === 'JP' ? `${last} ${first}` : `${first} ${last}`
  return { email, name, country, address: addressOf(chance, country, name, `${latin[0]} ${latin[1]}`) }
}

function addressOf(chance: Chance, country: string, name: string, latinName: string): AddressInput {
  const { street, latinStreet, latin, ...town } = chance.pick(TOWNS[country]!)
  const number = chance.whole(1, 88)
  const line = ['US', 'GB', 'FR', 'CA', 'AU'].includes(country)
    ? `${number} ${street}`
    : `${street} ${number}`
  return {
    country,
    name,
    lines: [line],
    ...town,
    ...(latin && { latin: { ...latin, name: latinName, lines: [`${number} ${latinStreet}`] } }),
  }
}
