import { type ParsedMail } from 'mailparser'

/** A mail as it arrived, for one receiver. */
export type KeptMail = {
  messageId: string
  to: string
  subject: string
  text: string
  html: string
  headers: Record<string, string>
  at: Date
}

/** Headers keep their order and their folded value; a name that comes twice is joined by a line feed. */
function headersOf(parsed: ParsedMail): Record<string, string> {
  const headers: Record<string, string> = {}
  for (const { key, line } of parsed.headerLines) {
    const value = line
      .slice(line.indexOf(':') + 1)
      .replaceAll(/\r?\n[ \t]+/g, ' ')
      .trim()
    headers[key] = key in headers ? `${headers[key]}\n${value}` : value
  }
  return headers
}

export function keptMail(parsed: ParsedMail, to: string): KeptMail {
  return {
    messageId: parsed.messageId ?? '',
    to: to.toLowerCase(),
    subject: parsed.subject ?? '',
    text: parsed.text ?? '',
    html: parsed.html || '',
    headers: headersOf(parsed),
    at: parsed.date ?? new Date(),
  }
}
