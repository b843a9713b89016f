/**
 * The address of the same page with some of its query changed; null or '' takes a parameter away.
 * For sort headings, filters and pages of a list, which live in the address.
 */
export function withParams(
  path: string,
  now: Readonly<Record<string, string | string[] | undefined>>,
  changes: Readonly<Record<string, string | null>>,
): string {
  const params = new URLSearchParams()
  for (const [name, value] of Object.entries(now)) {
    for (const one of [value].flat()) if (one !== undefined && !(name in changes)) params.append(name, one)
  }
  for (const [name, value] of Object.entries(changes)) if (value) params.set(name, value)
  const query = params.toString()
  return query ? `${path}?${query}` : path
}
