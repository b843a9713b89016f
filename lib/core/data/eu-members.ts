/**
 * The member states of the European Union by alpha-2 code. May change only with a treaty.
 * Source: Treaty on European Union, Article 52, less the United Kingdom since 31 January 2020; 27 states.
 */
export const EU_MEMBERS: readonly string[] = [
  ...['AT', 'BE', 'BG', 'CY', 'CZ', 'DE', 'DK', 'EE', 'ES', 'FI', 'FR', 'GR', 'HR', 'HU'],
  ...['IE', 'IT', 'LT', 'LU', 'LV', 'MT', 'NL', 'PL', 'PT', 'RO', 'SE', 'SI', 'SK'],
]

/**
 * Whether a country is a member state of the European Union. Says nothing of islands and special zones.
 * @example isEuMember('FI')  // → true
 * @example isEuMember('GB')  // → false
 */
export function isEuMember(country: string): boolean {
  return EU_MEMBERS.includes(country)
}
