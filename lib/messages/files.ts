import { offerWords } from './public'
import { writtenNumber } from './written'

const roles: Record<string, string> = {
  build_guide: 'Build guide',
  manual: 'Manual',
  parts_list: 'Parts list',
  declaration: 'Declaration of conformity',
  other: 'Something else',
}
const offers: Record<string, string> = offerWords

/** A module's pictures, sounds and documents. */
export const fileWords = {
  title: 'Pictures and files',
  lead: 'Pictures, sounds and documents of the module, its offers, its revisions and what was learned.',
  none: 'Nothing is kept yet. Add the first picture below.',
  subjects: {
    module: 'Of the module',
    offer: 'Of an offer',
    revision: 'Of a revision',
    lesson: 'Of a lesson',
  },
  subjectChoices: {
    module: 'The module itself',
    offer: 'An offer: its guide, its manual, its declaration',
    revision: 'A revision: its drawing, its first good unit',
    lesson: 'A lesson: a scope trace, a photograph of the fault',
  },
  seenBy: {
    module: 'Everybody can see these.',
    offer: 'Everybody can see these.',
    revision: 'Only those who work here see these.',
    lesson: 'Only those who work here see these.',
  },
  of: (subject: string, name: string) =>
    subject === 'offer' ? (offers[name] ?? name) : subject === 'revision' ? `Revision ${name}` : name,
  size: (bytes: number, sort: string) =>
    `${writtenNumber(Math.max(1, Math.round(bytes / 1000)))} kB${sort ? `, ${(roles[sort] ?? sort).toLowerCase()}` : ''}`,
  remove: 'Remove',
  removeNamed: (alt: string) => `Remove: ${alt}`,
  add: 'Add a file',
  file: 'File',
  fileHint: 'A picture of 50 megapixels at most, a sound (MP3, Ogg, FLAC, WAV) or a PDF; 25 MB at most.',
  alt: 'What is to be seen or heard',
  altHint: 'Read out to those who cannot see it: “Front panel from the left, four knobs in a row”.',
  subject: 'It belongs to',
  offer: 'Which offer',
  revision: 'Which revision',
  lesson: 'Which lesson',
  role: 'Which document',
  roles,
  mistakes: {
    empty_file: 'Choose a file that is not empty.',
    picture_with_script:
      'SVG pictures are not taken, since they may carry a program. Save it as PNG and send that.',
    too_many_pixels: 'This picture has more than 50 megapixels. Save it smaller and send that.',
    picture_broken: 'This picture cannot be read. Save it anew as PNG or JPEG and send that.',
    unknown_kind: 'This is no picture, no sound and no PDF. Send one of those.',
    noSubject: 'Choose one of this module.',
    tooMany: (kind: 'picture' | 'sound' | 'document', most: number) =>
      `There are ${most} ${kind}s here already, which is the most. Remove one first.`,
  },
} as const
