/** Everybody who may stand before a route; the last owns another workshop. */
export const ROLES = ['visitor', 'customer', 'owner', 'bench', 'packer', 'host', 'stranger'] as const
export type MatrixRole = (typeof ROLES)[number]

/** Status per role, in the order of ROLES; the rest says what is sent where an empty body is not enough. */
export type Row =
  | string
  | {
      who: string
      params?: Record<string, string | string[]>
      query?: string
      body?: unknown
      headers?: Record<string, string>
    }

/** The statuses of a row by role. */
export function expectedOf(row: Row): Record<MatrixRole, number> {
  const statuses = (typeof row === 'string' ? row : row.who).trim().split(/\s+/)
  if (statuses.length !== ROLES.length)
    throw new Error(`a row needs ${ROLES.length} statuses: ${statuses.join(' ')}`)
  return Object.fromEntries(ROLES.map((role, index) => [role, Number(statuses[index])])) as Record<
    MatrixRole,
    number
  >
}
