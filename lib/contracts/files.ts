import { z } from 'zod'
import { line, offerKind, optionalLine, uuid } from './fields'
import { revisionLetter } from './module-forms'
import { blank } from './rows'

/** Bytes of one file; a long sound is well below it. */
export const MOST_FILE_BYTES = 25_000_000
/** Pictures, sounds and documents of one thing. */
export const MOST_FILES = { picture: 40, sound: 5, document: 20 } as const
/** A picture of more pixels is no photograph of a front panel. */
export const MOST_PIXELS = 50_000_000

export const DOCUMENT_ROLES = ['build_guide', 'manual', 'parts_list', 'declaration', 'other'] as const
export type DocumentRole = (typeof DOCUMENT_ROLES)[number]
export type FileKind = keyof typeof MOST_FILES

/** A file for a module, or for one of its revisions, offers or lessons. */
export const FileInput = z.object({
  subject: z.enum(['module', 'revision', 'offer', 'lesson'], { error: 'Say what it belongs to.' }),
  revision: blank(revisionLetter),
  offer: blank(offerKind),
  lesson: blank(uuid),
  alt: line(500, 'Say what is to be seen or heard, for those who cannot.'),
  role: z.preprocess(
    (typed) => (typed === '' || typed === undefined ? 'other' : typed),
    z.enum(DOCUMENT_ROLES, { error: 'Say which document it is.' }),
  ),
  note: optionalLine(200),
})
export type FileInput = z.infer<typeof FileInput>
export const FileRemoval = z.object({ file: uuid })

export type FileView = {
  id: string
  kind: FileKind
  subject: 'module' | 'revision' | 'offer' | 'lesson'
  /** What it belongs to, in words: a letter, an offer, the symptom of a lesson; empty for the module. */
  of: string
  subjectId: string
  role: string
  alt: string
  fileName: string
  byteCount: number
  widthPx: number | null
  heightPx: number | null
  isPublic: boolean
}

/** What a module's files can belong to, and those there are. */
export type FilesDesk = {
  files: FileView[]
  revisions: string[]
  offers: ('boards' | 'kit' | 'built')[]
  lessons: { id: string; symptom: string }[]
}
