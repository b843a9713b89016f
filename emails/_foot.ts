import { type MailSender } from '@/lib/contracts/mails'
import { foot } from '@/lib/messages/mails/words'

export type Foot = {
  signedBy: string
  lines: string[]
  unsubscribe: { label: string; url: string } | null
}

/** The signature and the title block at the foot of a mail. */
export function footOf(sender: MailSender, unsubscribeUrl: string | null): Foot {
  return {
    signedBy: foot.signedBy(sender.maker, sender.workshop),
    lines: [
      ...(sender.postalAddress.length > 0 ? [sender.postalAddress.join(', ')] : []),
      sender.replyTo ? foot.replies(sender.maker) : foot.noReplies,
      foot.sentThrough(sender.workshop),
    ],
    unsubscribe: unsubscribeUrl ? { label: foot.unsubscribe, url: unsubscribeUrl } : null,
  }
}
