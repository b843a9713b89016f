import { type Result } from '@/lib/core/result'

export type Mailbox = { readonly name: string; readonly address: string }

/** One mail, ready to be handed to a mail server. */
export type Message = {
  /** With its angle brackets; the same at every attempt, so that a mail sent twice is known as one. */
  readonly messageId: string
  readonly from: Mailbox
  readonly replyTo: Mailbox | null
  readonly to: string
  readonly subject: string
  readonly html: string
  readonly text: string
  /** Where one POST ends such mails (RFC 8058); null on what the contract needs. */
  readonly unsubscribeUrl: string | null
  /** Business time. */
  readonly date: Date
}

/**
 * Why a mail did not go out. `unsafe_header`: a line break or an address that is none, never handed to a server.
 * `address_refused`: the server will never take mail for this address. `message_refused`: it will never take this
 * mail. `not_now`: busy, out of reach, or an answer that never came; the same mail may be tried again.
 */
export type SendFailure = 'unsafe_header' | 'address_refused' | 'message_refused' | 'not_now'

export type Mailer = {
  /** Hands one mail over. `answer` is the server's own last line. */
  readonly send: (message: Message) => Promise<Result<{ answer: string }, SendFailure>>
  readonly close: () => void
}
