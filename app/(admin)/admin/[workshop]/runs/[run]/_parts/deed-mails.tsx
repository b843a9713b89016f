import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import { writeMail } from '@/emails/write-mail'
import type { Actor } from '@/lib/core/policy/can'
import { runWords as words } from '@/lib/messages/runs'
import { type DeedAhead, type MailAhead, previewRunMails } from '@/lib/services/runs/preview-run-mails'

type Props = { actor: Actor; workshopId: string; runId: string; ahead: DeedAhead }

/** The very mail a deed sends, as the first buyer will read it. */
export async function DeedMails({ actor, workshopId, runId, ahead }: Props) {
  const seen = await previewRunMails({ actor, workshopId, runId, ahead })
  if (!seen.ok) return null
  if (seen.value === null)
    return (
      <Sheet title={words.mailTitle} id="mail">
        <p>{words.mailNobody}</p>
      </Sheet>
    )
  const mail = await written(seen.value)
  return (
    <Sheet title={words.mailTitle} id="mail" aside={words.mailCount(seen.value.count)}>
      <p className="max-w-words pb-3 text-15 text-quiet">{words.mailLead}</p>
      <p className="border-t border-rule pt-3 pb-2 font-semibold">{mail.subject}</p>
      <div className="max-w-words text-15 [overflow-wrap:anywhere]">
        <PlainText text={mail.text} />
      </div>
    </Sheet>
  )
}

function written(ahead: MailAhead) {
  const { sender } = ahead
  if (ahead.kind === 'run_locked') return writeMail(ahead.kind, ahead.props, sender, null)
  if (ahead.kind === 'run_called_off') return writeMail(ahead.kind, ahead.props, sender, null)
  return writeMail(ahead.kind, ahead.props, sender, null)
}
