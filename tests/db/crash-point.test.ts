import { spawnSync } from 'node:child_process'
import { expect, test } from 'vitest'
import { crashPoint } from '@/lib/db/crash-point'

test('does nothing where no crash was asked for', () => {
  expect(crashPoint('attempt_sent')).toBeUndefined()
})

test('kills the process at the point asked for, and at no other', () => {
  const reach = (asked: string) =>
    spawnSync(process.execPath, ['scripts/run.mjs', 'tests/db/fixtures/reach-crash-point.ts'], {
      env: { ...process.env, CRASH_AT: asked },
      encoding: 'utf8',
    })
  expect(reach('attempt_sent')).toMatchObject({ signal: 'SIGKILL', stdout: '' })
  expect(reach('event_stored')).toMatchObject({ status: 0, stdout: 'passed' })
})
