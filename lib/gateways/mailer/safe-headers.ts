import 'server-only'
import { ok, refuse, type Result } from '@/lib/core/result'
import { type Message } from '@/lib/gateways/mailer/types'

const LINE_BREAK = /[\p{Cc}\u2028\u2029]/u
/** One address and nothing else: no list, no display name, no quoting that could hide a second header. */
const ONE_ADDRESS = /^[^\s\p{Cc}@<>(),;:"\\[\]]+@[^\s\p{Cc}@<>(),;:"\\[\]]+$/u
const MESSAGE_ID = /^<[\w.+=-]+@[\w.-]+>$/

/**
 * Lets a message pass whose headers are exactly what they seem.
 * A name with a line break in it could add headers or a second receiver; such a mail is refused, not mended, since
 * something let the name in that should not have.
 * Refuses: 'unsafe_header' when an address is not one plain address, or a header's text holds a control character.
 */
export function withSafeHeaders(message: Message): Result<Message, 'unsafe_header'> {
  const addresses = [message.to, message.from.address, ...(message.replyTo ? [message.replyTo.address] : [])]
  const texts = [
    message.subject,
    message.from.name,
    message.replyTo?.name ?? '',
    message.unsubscribeUrl ?? '',
  ]
  const safe =
    MESSAGE_ID.test(message.messageId) &&
    addresses.every((address) => address.length <= 254 && ONE_ADDRESS.test(address)) &&
    texts.every((text) => !LINE_BREAK.test(text)) &&
    (message.unsubscribeUrl === null || URL.canParse(message.unsubscribeUrl))
  return safe ? ok(message) : refuse('unsafe_header')
}
