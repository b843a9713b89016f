import { stringify } from 'csv-stringify/sync'

/** A number below zero is a number, a text that begins with a minus is made harmless. */
type Cell = string | number

/**
 * A table as a CSV file. A cell that a spreadsheet would read as a formula gets an apostrophe in front, so that an address
 * somebody typed is text wherever it is opened.
 */
export function csv(columns: readonly string[], rows: readonly (readonly Cell[])[], name: string): Response {
  return new Response(csvText(columns, rows), {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="${name.replace(/[^A-Za-z0-9._-]/g, '-')}"`,
      'cache-control': 'no-store',
    },
  })
}

/** The same as text, with the mark by which spreadsheets know UTF-8. */
export const csvText = (columns: readonly string[], rows: readonly (readonly Cell[])[]): string =>
  stringify([[...columns], ...rows.map((row) => [...row])], { bom: true, escape_formulas: true })
