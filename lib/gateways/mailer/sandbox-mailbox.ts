import 'server-only'
import { Pool } from 'pg'
import { databaseUrl, env } from '@/lib/config/env'

export type SandboxMail = {
  id: string
  to: string
  subject: string
  text: string
  html: string
  headers: Record<string, string>
  at: string
}

let pool: Pool | undefined

/**
 * What the sandbox's mail server holds, newest first; `to` names one receiver. Sandbox only, on a connection of
 * its own. Empty until the server has started once.
 */
export async function readSandboxMails({
  to,
  limit = 200,
}: {
  to?: string
  limit?: number
}): Promise<SandboxMail[]> {
  if (!env().SANDBOX) throw new Error('There is no sandbox mailbox while real mail is sent.')
  pool ??= makePool()
  const { rows: made } = await pool.query<{ made: boolean }>(
    `select to_regclass('sandbox_mail.mails') is not null as made`,
  )
  if (!made[0]?.made) return []
  const { rows } = await pool.query<Omit<SandboxMail, 'at'> & { at: Date }>(
    `select id::text, sent_to as "to", subject, body_text as text, body_html as html, headers, at
     from sandbox_mail.mails where $1::text is null or sent_to = lower($1) order by id desc limit $2`,
    [to ?? null, limit],
  )
  return rows.map((row) => ({ ...row, at: row.at.toISOString() }))
}

/** Lets go of the mailbox's connections; for tests, whose database goes away under it. */
export async function closeSandboxMailbox(): Promise<void> {
  await pool?.end()
  pool = undefined
}

function makePool(): Pool {
  const made = new Pool({
    connectionString: databaseUrl(),
    max: 2,
    idleTimeoutMillis: 5_000,
    allowExitOnIdle: true,
  })
  // An idle connection that is lost is opened anew with the next look.
  made.on('error', () => {})
  return made
}
