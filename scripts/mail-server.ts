import { env } from '@/lib/config/env'
import { openMailStore } from './sandbox-mail/mail-store'
import { startMailServer } from './sandbox-mail/start-mail-server'

/** The sandbox's mail server: listens where SMTP_URL points, on loopback; says `ready`; ends on SIGTERM or SIGINT. */
const url = new URL(env().SMTP_URL)
if (!['127.0.0.1', 'localhost'].includes(url.hostname)) {
  throw new Error('SMTP_URL names a server that is not on this machine; the sandbox serves loopback only.')
}
const store = await openMailStore(env().DATABASE_URL)
const server = await startMailServer({ port: Number(url.port), keep: store.keep })
console.log('ready')

let isEnding = false
async function end() {
  if (isEnding) return
  isEnding = true
  await server.close()
  await store.close()
  process.exit(0)
}
process.on('SIGTERM', () => void end())
process.on('SIGINT', () => void end())
