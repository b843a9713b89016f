import { QueryTypes } from 'sequelize'
import { expect, test } from 'vitest'
import { READINESS_KEYS } from '@/lib/core/states/run-readiness'
import { ATTEMPT_MOVES } from '@/lib/core/states/attempt'
import { INVITATION_MOVES } from '@/lib/core/states/invitation'
import { LOT_MOVES } from '@/lib/core/states/lot'
import { MAIL_MOVES } from '@/lib/core/states/mail'
import { MODULE_MOVES } from '@/lib/core/states/module'
import { ORDER_MOVES } from '@/lib/core/states/order'
import { PARCEL_MOVES } from '@/lib/core/states/parcel'
import { PROBLEM_MOVES } from '@/lib/core/states/problem'
import { PURCHASE_LINE_MOVES } from '@/lib/core/states/purchase-line'
import { REFUND_MOVES } from '@/lib/core/states/refund'
import { REVISION_MOVES } from '@/lib/core/states/revision'
import { RUN_MOVES } from '@/lib/core/states/run'
import { SIGNUP_MOVES } from '@/lib/core/states/signup'
import { UNIT_MOVES } from '@/lib/core/states/unit'
import { WORKSHOP_MOVES } from '@/lib/core/states/workshop'
import { sequelize } from '@/lib/db/sequelize'

const MOVES: [table: string, moves: readonly { to: string }[]][] = [
  ['workshops', WORKSHOP_MOVES],
  ['modules', MODULE_MOVES],
  ['revisions', REVISION_MOVES],
  ['runs', RUN_MOVES],
  ['signups', SIGNUP_MOVES],
  ['invitations', INVITATION_MOVES],
  ['orders', ORDER_MOVES],
  ['payment_attempts', ATTEMPT_MOVES],
  ['refunds', REFUND_MOVES],
  ['units', UNIT_MOVES],
  ['parcels', PARCEL_MOVES],
  ['purchase_lines', PURCHASE_LINE_MOVES],
  ['lots', LOT_MOVES],
  ['mail_outbox', MAIL_MOVES],
  ['problems', PROBLEM_MOVES],
]

/** The words a check `column in (…)` allows, sorted. */
async function wordsOf(constraint: string): Promise<string[]> {
  const [row] = await sequelize.query<{ text: string }>(
    'select pg_get_constraintdef(oid) as text from pg_constraint where conname = :constraint',
    { replacements: { constraint }, type: QueryTypes.SELECT },
  )
  if (!row) throw new Error(`no constraint ${constraint}`)
  return [...row.text.matchAll(/'(\w+)'::text/g)].map(([, word]) => word!).sort()
}

test.each(MOVES)('%s may hold exactly the states of the core', async (table, moves) => {
  expect(await wordsOf(`${table}_state_check`)).toEqual([...new Set(moves.map((move) => move.to))].sort())
})

test('a waiver names a line of the readiness list', async () => {
  expect(await wordsOf('waivers_key_check')).toEqual([...READINESS_KEYS].sort())
})
