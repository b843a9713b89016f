import { type MailKind, type MailProps, type MailSender } from '@/lib/contracts/mails'
import { type Say } from '@/emails/_say'

export type Row = { label: string; value: string; note?: string; strong?: boolean }

/** A mail before it has a form: the HTML and the plain text are both made from these, so they state the same. */
export type Block =
  | { kind: 'para'; text: string }
  | { kind: 'rows'; rows: Row[] }
  | { kind: 'action'; label: string; url: string }
  | { kind: 'link'; label: string; url: string }
  | { kind: 'written'; text: string }
  | { kind: 'terms'; title: string; text: string }

export type Letter = {
  subject: string
  /** The line an inbox shows beside the subject. */
  preview: string
  blocks: Block[]
}

export type Write<K extends MailKind> = (facts: MailProps<K>, say: Say, sender: MailSender) => Letter

export const para = (text: string): Block => ({ kind: 'para', text })
export const rows = (...list: (Row | false)[]): Block => ({
  kind: 'rows',
  rows: list.filter((row) => row !== false),
})
export const action = (label: string, url: string): Block => ({ kind: 'action', label, url })
export const link = (label: string, url: string): Block => ({ kind: 'link', label, url })
/** What a person wrote, as it was written. */
export const written = (text: string): Block => ({ kind: 'written', text })
export const terms = (title: string, text: string): Block => ({ kind: 'terms', title, text })

/** Leaves out what does not apply. */
export const blocks = (...list: (Block | false | null)[]): Block[] =>
  list.filter((block) => block !== null && block !== false)

/** Paragraphs of a text: parted by empty lines, each with its own lines. */
export const paragraphsOf = (text: string): string[][] =>
  text
    .replaceAll('\r\n', '\n')
    .split(/\n[ \t]*\n+/)
    .map((paragraph) => paragraph.split('\n').map((line) => line.trimEnd()))
    .filter((lines) => lines.some((line) => line !== ''))
