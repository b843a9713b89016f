import { simpleParser } from 'mailparser'
import { type AddressInfo } from 'node:net'
import { SMTPServer, type SMTPServerSession } from 'smtp-server'
import { keptMail, type KeptMail } from './kept-mail'

type Options = { port: number; keep: (mail: KeptMail) => Promise<void> }
export type MailServer = { port: number; close: () => Promise<void> }

const LARGEST_BYTES = 1_000_000
const answer = (code: number, text: string) => Object.assign(new Error(text), { responseCode: code })
const isNamed = (address: string, name: string) => new RegExp(`^${name}([+.-].*)?@`, 'i').test(address)

/**
 * A mail server on loopback that keeps what it is given. Addresses that begin with `bounce` do not exist here
 * (550), those that begin with `later` are not served on the first try (451); names may go on after `+`, `.` or `-`.
 */
export async function startMailServer({ port, keep }: Options): Promise<MailServer> {
  const askedBefore = new Set<string>()

  const server = new SMTPServer({
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: LARGEST_BYTES,
    onRcptTo({ address }, _session, done) {
      if (isNamed(address, 'bounce')) return done(answer(550, '5.1.1 No such mailbox here'))
      if (isNamed(address, 'later') && !askedBefore.has(address)) {
        askedBefore.add(address)
        return done(answer(451, '4.7.1 Come back later'))
      }
      done()
    },
    onData(stream, session: SMTPServerSession, done) {
      simpleParser(stream)
        .then(async (parsed) => {
          if (stream.sizeExceeded) return done(answer(552, '5.3.4 Larger than 1 MB'))
          for (const { address } of session.envelope.rcptTo) await keep(keptMail(parsed, address))
          done()
        })
        .catch((error: unknown) => done(answer(451, `4.3.0 Could not keep it: ${String(error)}`)))
    },
  })
  // A client that hangs up in the middle of a talk is its own affair.
  server.on('error', () => {})

  await new Promise<void>((resolve, reject) => {
    server.server.once('error', reject)
    server.listen(port, '127.0.0.1', resolve)
  })
  return {
    port: (server.server.address() as AddressInfo).port,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  }
}
