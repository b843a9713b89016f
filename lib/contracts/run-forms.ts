type Fields = Record<string, unknown>

const rowsOf = (value: unknown): Fields[] => (Array.isArray(value) ? (value as Fields[]) : [])
const isFilled = (value: unknown) => typeof value === 'string' && value.trim() !== ''

/** A drafted run as its form sends it: an offer whose posted-by date is empty is left out, an empty head start is the workshop's. */
export function readRunForm({ headStartHours, ...body }: Fields): Fields {
  return {
    ...body,
    ...(isFilled(headStartHours) && { headStartHours }),
    offers: rowsOf(body.offers).filter(({ postedBy }) => isFilled(postedBy)),
  }
}

/** A lock as its form sends it: lines let pass without a reason are not let pass; the words to be typed must be there. */
export function readLockForm(body: Fields): Fields {
  const waivers = rowsOf(body.waivers).filter(({ reason }) => isFilled(reason))
  return { ...body, waivers, typed: body.typed ?? '' }
}

/** A deed as its check page sends it: the words to be typed must be there. */
export function readTypedForm(body: Fields): Fields {
  return { ...body, typed: body.typed ?? '' }
}

/**
 * Sentences about rows a form was read without the empty ones of, back at the rows as they were typed: 'offers.0.…' may be
 * about the second row when the first was left empty. `deciding` is the field that leaves a row out.
 */
export function atTypedRows(
  kept: { values: Record<string, string>; errors: Record<string, string> },
  list: string,
  deciding: string,
): Record<string, string> {
  const rows = Object.entries(kept.values)
    .flatMap(([name, value]) => {
      const row = new RegExp(`^${list}\\.(\\d+)\\.${deciding}$`).exec(name)?.[1]
      return row !== undefined && value.trim() !== '' ? [Number(row)] : []
    })
    .sort((a, b) => a - b)
  const moved = (name: string) =>
    name.replace(new RegExp(`^${list}\\.(\\d+)\\.`), (_, at: string) => `${list}.${rows[Number(at)] ?? at}.`)
  return Object.fromEntries(Object.entries(kept.errors).map(([name, sentence]) => [moved(name), sentence]))
}
