import { SECRET_LINKS } from '@/lib/contracts/mails'
import { MailOutbox, Person } from '@/models'

/** The token of the link in the newest mail of a kind to an address, as the outbox keeps it until it is sent. */
export async function tokenOf(kind: 'confirm_signup' | 'signup_confirmed', email: string): Promise<string> {
  const person = await Person.findOne({ where: { emailNormal: email }, rejectOnEmpty: true })
  const mail = await MailOutbox.findOne({
    where: { kind, personId: person.id },
    order: [['queuedAt', 'DESC']],
    rejectOnEmpty: true,
  })
  const link = String((mail.secrets as Record<string, unknown>)[SECRET_LINKS[kind]![0]!])
  return link.split('/').at(-1)!
}
