import { render } from '@react-email/render'
import { footOf } from '@/emails/_foot'
import { LetterSheet } from '@/emails/_layout'
import { type Write } from '@/emails/_letter'
import { LETTERS } from '@/emails/_letters'
import { plainText } from '@/emails/_plain-text'
import { sayFor } from '@/emails/_say'
import { MAILS, type MailKind, type MailProps, type MailSender } from '@/lib/contracts/mails'

export type WrittenMail = { subject: string; html: string; text: string }

/**
 * Writes one mail as HTML and as plain text, with the same facts in the same order. `unsubscribeUrl` is the page on
 * which news and invitations are ended; null on every other mail. Facts that do not fit the kind's schema are a bug
 * of the caller and throw.
 */
export async function writeMail<K extends MailKind>(
  kind: K,
  facts: MailProps<K>,
  sender: MailSender,
  unsubscribeUrl: string | null,
): Promise<WrittenMail> {
  const checked = MAILS[kind].parse(facts) as MailProps<K>
  const write: Write<K> = LETTERS[kind]
  const letter = write(checked, sayFor(sender.timeZone), sender)
  const foot = footOf(sender, unsubscribeUrl)
  const html = await render(<LetterSheet letter={letter} foot={foot} />)
  return { subject: letter.subject, html, text: plainText(letter, foot) }
}
