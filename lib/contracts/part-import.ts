import { z } from 'zod'
import { uuid, type OfferKind } from './fields'
import { revisionLetter } from './module-forms'
import { blank } from './rows'

export const IMPORT_KINDS = ['lines', 'quotes'] as const
export const ENCODINGS = ['utf-8', 'windows-1252', 'utf-16le', 'utf-16be'] as const
export const DELIMITERS = ['comma', 'semicolon', 'tab', 'pipe'] as const
export type ImportKind = (typeof IMPORT_KINDS)[number]
export type Encoding = (typeof ENCODINGS)[number]
export type Delimiter = (typeof DELIMITERS)[number]

/** Bytes of one file; 5,000 lines with their quotes are well below it. */
export const MOST_IMPORT_BYTES = 4_000_000
export const MOST_IMPORT_LINES = 5000

/** A file, or a pasted text, to look at before anything is saved. */
export const ImportStart = z.object({
  revision: revisionLetter,
  kind: z.enum(IMPORT_KINDS, { error: 'Say what is in it.' }).default('lines'),
  text: z.string().max(MOST_IMPORT_BYTES, 'This is too long.').default(''),
})
export type ImportStart = z.infer<typeof ImportStart>

const placer = z.preprocess(
  (typed) => typed ?? '',
  z.enum(['', 'assembler', 'maker', 'buyer'], { error: 'Choose who places it.' }),
)

/** How a file is to be read, where it was not found out rightly. */
export const ImportSettings = z
  .object({
    import: uuid,
    encoding: z.enum(ENCODINGS, { error: 'Choose an encoding.' }),
    delimiter: z.enum(DELIMITERS, { error: 'Choose what separates the cells.' }),
    columns: z.array(z.string().max(40)).max(60).default([]),
    placedBy: z
      .object({ boards: placer, kit: placer, built: placer })
      .default({ boards: '', kit: '', built: '' }),
  })
  .superRefine(({ columns }, check) => {
    columns.forEach((heading, i) => {
      if (heading !== '' && columns.indexOf(heading) !== i)
        check.addIssue({
          code: 'custom',
          path: ['columns', i],
          message: 'Another column is read as this already. Choose one of the two.',
        })
    })
  })
export type ImportSettings = z.infer<typeof ImportSettings>

export const ImportConfirm = z.object({ import: uuid })
export const ImportQuery = z.object({
  import: blank(uuid).catch(undefined),
  revision: z.string().max(2).optional().catch(undefined),
  kind: z.enum(IMPORT_KINDS).catch('lines'),
})

/** A mistake that keeps a file from being saved, at its line and column. */
export type ImportProblem = { line: number | null; column: string; words: string }

export type ImportChange = {
  code: string
  what: 'added' | 'removed' | 'changed'
  /** Fields that differ, with what they were and will be. */
  fields: { name: string; before: string; after: string }[]
}

/** A file as it is read, before anything of it is saved. */
export type ImportPreview = {
  id: string
  kind: ImportKind
  revision: string
  /** The file as text, to be mended on the spot; empty where it is too long for that. */
  text: string
  fileName: string
  encoding: Encoding
  delimiter: Delimiter
  /** The file's own headings, our heading for each ('' is left out), and the first cell beneath. */
  columns: { heading: string; as: string; example: string }[]
  headings: readonly string[]
  placedBy: Partial<Record<OfferKind, string>>
  lines: number
  /** The first lines as they are read, and every line something is wrong with. */
  shown: { line: number; cells: string[]; words: string[] }[]
  shownHeadings: string[]
  problems: ImportProblem[]
  findings: {
    line: number | null
    code: string | null
    problem: string
    severity: 'error' | 'advice'
    detail: string
  }[]
  changes: ImportChange[]
  unchanged: number
}
