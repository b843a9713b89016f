import { QueryTypes } from 'sequelize'
import { expect, test } from 'vitest'
import { sequelize } from '@/lib/db/sequelize'
import { Invitation, ParcelLine, Unit } from '@/models'
import { makeModule } from '../support/worlds/module'
import { makeOrder } from '../support/worlds/order'
import { makeParcel } from '../support/worlds/parcel'
import { makeRun } from '../support/worlds/run'
import { makeSignUp } from '../support/worlds/sign-up'
import { makeWorkshop } from '../support/worlds/workshop'
import { NOW } from '../support/worlds/base'
import { refusedBy } from './refused-by'

const OWNED = `select table_name from information_schema.columns
  where table_schema = 'public' and column_name = 'workshop_id' and is_nullable = 'NO'`

test('every owned table can be pointed at together with its workshop', async () => {
  const missing = await sequelize.query(
    `${OWNED} except select conrelid::regclass::text from pg_constraint
     where contype = 'u' and pg_get_constraintdef(oid) = 'UNIQUE (workshop_id, id)'`,
    { type: QueryTypes.SELECT },
  )
  expect(missing).toEqual([])
})

test('one owned row points at another only together with the workshop', async () => {
  const loose = await sequelize.query(
    `select conname from pg_constraint where contype = 'f' and array_length(conkey, 1) = 1
       and conrelid::regclass::text in (${OWNED}) and confrelid::regclass::text in (${OWNED})`,
    { type: QueryTypes.SELECT },
  )
  expect(loose).toEqual([])
})

test('a run cannot be of another workshop’s module', async () => {
  const ours = await makeWorkshop()
  const theirs = await makeModule((await makeWorkshop()).workshop)
  const constraint = await refusedBy(() => makeRun({ workshop: ours.workshop, terms: ours.terms, ...theirs }))
  expect(constraint).toBe('runs_module_id_fkey')
})

test('an invitation, a unit and a parcel line stay within their workshop', async () => {
  const ours = await makeRun()
  const theirs = await makeRun()
  const { signup, person } = await makeSignUp(theirs.offers.kit)
  const { workshopId } = ours.run
  const invitation = { workshopId, runId: ours.run.id, signupId: signup.id, personId: person.id, sentAt: NOW }
  expect(await refusedBy(() => Invitation.create(invitation))).toBe('invitations_signup_id_fkey')

  const unit = {
    workshopId,
    revisionId: ours.revision.id,
    runId: theirs.run.id,
    serial: 'A-1',
    startedAt: NOW,
  }
  expect(await refusedBy(() => Unit.create(unit))).toBe('units_run_id_fkey')

  const our = await makeOrder({ run: ours.run, lines: [{ offer: ours.runOffers.kit, quantity: 1 }] })
  const their = await makeOrder({ run: theirs.run, lines: [{ offer: theirs.runOffers.kit, quantity: 1 }] })
  const { parcel } = await makeParcel(our.order, our.lines)
  const line = { workshopId, parcelId: parcel.id, orderLineId: their.lines[0]!.id, quantity: 1 }
  expect(await refusedBy(() => ParcelLine.create(line))).toBe('parcel_lines_order_line_id_fkey')
})
