import { z } from 'zod'

/** What a form leaves empty counts as left out. */
export const blank = <T extends z.ZodType>(schema: T) =>
  z.preprocess((typed) => (typed === '' || typed === null ? undefined : typed), schema.optional())

/**
 * Rows of a form, of which empty ones are left out. A row is empty when nothing is typed in it; `beside` names fields
 * that always hold something (a list of kinds, say). A sentence stands at the row as it was numbered when typed.
 */
export function rows<T extends z.ZodType>(row: T, most: number, beside: readonly string[] = []) {
  const each = z.preprocess((typed) => (isEmpty(typed, beside) ? undefined : typed), row.optional())
  const list = z
    .array(each, { error: 'Enter a list.' })
    .max(most, `Enter at most ${most} rows.`)
    .transform((found) => found.filter((one): one is NonNullable<typeof one> => one !== undefined))
  return z.preprocess((typed) => (typed === '' || typed === undefined || typed === null ? [] : typed), list)
}

function isEmpty(typed: unknown, beside: readonly string[]): boolean {
  if (typed === '' || typed === undefined || typed === null) return true
  if (Array.isArray(typed)) return typed.every((each) => isEmpty(each, beside))
  if (typeof typed !== 'object') return false
  return Object.entries(typed).every(([name, value]) => beside.includes(name) || isEmpty(value, beside))
}
