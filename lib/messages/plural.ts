/** The forms a language needs for counted things; '#' stands for the number. English uses one and other. */
export type PluralForms = { readonly other: string } & {
  readonly [rule in Exclude<Intl.LDMLPluralRule, 'other'>]?: string
}

const rules = new Map<string, Intl.PluralRules>()
const numbers = new Map<string, Intl.NumberFormat>()

/**
 * A counted thing in words, by the plural rules of the language.
 * @example plural(1, { one: '# order', other: '# orders' })  // → '1 order'
 * @example plural(1200, { one: '# order', other: '# orders' })  // → '1,200 orders'
 */
export function plural(count: number, forms: PluralForms, locale = 'en-GB'): string {
  const rule = cached(rules, locale, () => new Intl.PluralRules(locale)).select(count)
  const figure = cached(numbers, locale, () => new Intl.NumberFormat(locale)).format(count)
  return (forms[rule] ?? forms.other).replaceAll('#', figure)
}

function cached<T>(store: Map<string, T>, key: string, make: () => T): T {
  const known = store.get(key)
  if (known) return known
  const made = make()
  store.set(key, made)
  return made
}
