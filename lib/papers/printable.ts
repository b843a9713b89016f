import { faceOf, facesFor, hasLetter, REGULAR } from './faces'

/** A stretch of text that one face prints. */
export type Stretch = { face: string; text: string }

const has = (doc: PDFKit.PDFDocument, letter: string) =>
  letter === '\n' || faceOf(doc, letter, false) !== null

/** Whether some face has every letter of a text. */
export const isPrintable = (doc: PDFKit.PDFDocument, text: string) =>
  [...text.normalize('NFC')].every((letter) => has(doc, letter))

/**
 * The text as the faces can print it. A letter none has would vanish without a trace: it loses its accent where the bare
 * letter is there, and becomes a question mark where it is not.
 */
export function printable(doc: PDFKit.PDFDocument, text: string): string {
  return [...text.normalize('NFC')]
    .map((letter) =>
      has(doc, letter) ? letter : ([...letter.normalize('NFD')].find((bare) => has(doc, bare)) ?? '?'),
    )
    .join('')
}

/** Chinese, Japanese and Korean letters stand by themselves; the rest are words. */
const CJK = '\\u2e80-\\u9fff\\uac00-\\ud7af\\uf900-\\ufaff\\uff00-\\uffef'
export const WORDS = new RegExp(`[${CJK}]|[^\\s${CJK}]+\\s*|\\s+`, 'gu')

/**
 * A printable text cut where its face changes. A word keeps to one face where one has all its letters; a space stays with
 * what stands before it.
 */
export function stretchesOf(doc: PDFKit.PDFDocument, text: string, bold: boolean): Stretch[] {
  const stretches: Stretch[] = []
  for (const word of text.match(WORDS) ?? []) {
    const whole = wholeFaceOf(doc, word.trim(), bold)
    for (const letter of whole === null ? word : [word]) {
      const last = stretches.at(-1)
      const isBlank = letter.trim() === ''
      const face = isBlank && last ? last.face : (whole ?? faceOf(doc, letter, bold) ?? REGULAR)
      if (last?.face === face) last.text += letter
      else stretches.push({ face, text: letter })
    }
  }
  return stretches
}

function wholeFaceOf(doc: PDFKit.PDFDocument, word: string, bold: boolean): string | null {
  return facesFor(bold).find((name) => [...word].every((letter) => hasLetter(doc, name, letter))) ?? null
}
