import { setTimeout as wait } from 'node:timers/promises'
import { Client } from 'pg'
import { log } from '@/lib/config/log'
import { PAGE_CHANGED } from '@/lib/db/page-changed'
import { evict } from '../../cache-handler.mjs'

const LONGEST_WAIT_MS = 5000

/**
 * Drops kept pages as services say they changed. What was said while the connection was down is lost, so every
 * page goes after each reconnect.
 */
export function listenForChanges(databaseUrl: string): { close: () => Promise<void> } {
  let isClosed = false
  let client: Client | undefined

  async function listen() {
    client = new Client({ connectionString: databaseUrl, keepAlive: true })
    const lost = new Promise<void>((resolve) => {
      client?.on('end', resolve)
      client?.on('error', () => resolve())
    })
    client.on('notification', ({ payload }) => payload && evict(payload))
    await client.connect()
    await client.query(`listen ${PAGE_CHANGED}`)
    evict('*')
    await lost
  }

  async function keepListening() {
    for (let failures = 0; !isClosed; failures += 1) {
      const began = Date.now()
      await listen().catch((error: unknown) => log().warn({ error }, 'cannot listen for page changes'))
      if (isClosed) return
      if (Date.now() - began > LONGEST_WAIT_MS) failures = 0
      await client?.end().catch(() => {})
      await wait(Math.min(LONGEST_WAIT_MS, 200 * 2 ** failures))
    }
  }

  void keepListening()
  return {
    close: async () => {
      isClosed = true
      await client?.end().catch(() => {})
    },
  }
}
