import { spawn } from 'node:child_process'
import { randomUUID } from 'node:crypto'
import { once } from 'node:events'
import { expect, test } from 'vitest'
import { makePerson } from '@/tests/support/worlds/person'
import { makeWorkshop } from '@/tests/support/worlds/workshop'
import { queued, sent, useMailServer } from './mail-world'

const arrived = useMailServer()

async function sendAndDieAt(crashAt: string, mailId: string) {
  const child = spawn(
    process.execPath,
    ['--import', 'tsx', 'tests/services/mails/fixtures/send-one.ts', mailId],
    {
      env: { ...process.env, CRASH_AT: crashAt, TSX_TSCONFIG_PATH: 'tsconfig.scripts.json' },
      stdio: ['ignore', 'ignore', 'inherit'],
    },
  )
  const [, signal] = await once(child, 'exit')
  expect(signal).toBe('SIGKILL')
}

test.each([
  ['mail_claimed', { state: 'sending', copies: 0 }, 1],
  ['mail_accepted', { state: 'sending', copies: 1 }, 2],
  ['mail_sent', { state: 'sent', copies: 1 }, 1],
] as const)(
  'killed at %s, the mail arrives, and a second copy says it is the same mail',
  async (point, left, copies) => {
    const { workshop } = await makeWorkshop()
    const person = await makePerson()
    const mail = await queued('refund_sent', { person, workshopId: workshop.id, subjectId: randomUUID() })
    await sendAndDieAt(point, mail.id)
    await mail.reload()
    expect({ state: mail.state, copies: arrived.length }).toEqual(left)

    expect((await sent(mail)).state).toBe('sent')
    expect(arrived).toHaveLength(copies)
    expect(new Set(arrived.map((one) => one.messageId))).toEqual(new Set([mail.messageId]))
  },
)
