import 'server-only'

/** Rows in one statement: few statements, and none longer than the database takes. */
const CHUNK = 500

/** A list in pieces that fit one statement each. */
export function inChunks<T>(list: readonly T[]): T[][] {
  return Array.from({ length: Math.ceil(list.length / CHUNK) }, (_, i) =>
    list.slice(i * CHUNK, (i + 1) * CHUNK),
  )
}
