type Fields = Record<string, unknown>

/**
 * The body behind the packing form: lines nobody ticked are left out, and serial numbers typed into one field with spaces,
 * commas or line breaks between them become a list.
 */
export function readPackForm(body: Fields): Fields {
  const rows = Array.isArray(body.lines) ? (body.lines as Fields[]) : []
  const ticked = rows.filter((row) => typeof row === 'object' && row !== null && row.line !== undefined)
  return { ...body, lines: ticked.map((row) => ({ ...row, serials: listOf(row.serials) })) }
}

function listOf(typed: unknown): unknown {
  if (typeof typed !== 'string') return typed
  const serials = typed.split(/[\s,;]+/).filter(Boolean)
  return serials.length > 0 ? serials : undefined
}
