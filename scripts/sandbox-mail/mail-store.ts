import { Pool } from 'pg'
import { type KeptMail } from './kept-mail'

/**
 * The sandbox mailbox, in a schema of its own and on connections of its own: the application's transactions do not
 * touch it. A mail that comes again with the same Message-ID is counted, not kept twice, as mail stores do.
 */
export async function openMailStore(databaseUrl: string) {
  const pool = new Pool({ connectionString: databaseUrl, max: 3 })
  pool.on('error', () => {})
  await makeTable(pool)

  async function keep(mail: KeptMail): Promise<void> {
    await pool.query(
      `insert into sandbox_mail.mails (message_id, sent_to, subject, body_text, body_html, headers, at)
       values ($1, $2, $3, $4, $5, $6, $7)
       on conflict (message_id, sent_to) do update set times = sandbox_mail.mails.times + 1`,
      [mail.messageId, mail.to, mail.subject, mail.text, mail.html, JSON.stringify(mail.headers), mail.at],
    )
  }

  return { keep, close: () => pool.end() }
}

async function makeTable(pool: Pool): Promise<void> {
  const client = await pool.connect()
  try {
    // Two servers that start at once must not both make it.
    await client.query('begin')
    await client.query(`select pg_advisory_xact_lock(727, hashtext('sandbox_mail'))`)
    await client.query('create schema if not exists sandbox_mail')
    await client.query(
      `create table if not exists sandbox_mail.mails (
         id bigint generated always as identity primary key,
         message_id text not null,
         sent_to text not null,
         subject text not null,
         body_text text not null,
         body_html text not null,
         headers jsonb not null,
         at timestamptz not null,
         times integer not null default 1,
         unique (message_id, sent_to))`,
    )
    await client.query('create index if not exists mails_sent_to_idx on sandbox_mail.mails (sent_to, id)')
    await client.query('commit')
  } finally {
    client.release()
  }
}
