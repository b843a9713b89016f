import type { Transaction } from 'sequelize'
import { expect, test } from 'vitest'
import { ok, refuse, type Result } from '@/lib/core/result'
import { inTransaction } from '@/lib/db/in-transaction'
import { sequelize } from '@/lib/db/sequelize'
import { Person } from '@/models'
import { NOW } from '../support/worlds/base'
import { makePerson } from '../support/worlds/person'

const named = (name: string) => Person.count({ where: { name } })
const write = (name: string, transaction: Transaction) =>
  Person.create({ name, emailNormal: `${name}@example.org`, createdAt: NOW }, { transaction })

test('what answers ok is kept', async () => {
  const done = await inTransaction(async (tx) => {
    await write('kept', tx)
    return ok('done')
  })
  expect(done).toEqual(ok('done'))
  expect(await named('kept')).toBe(1)
})

test('a refusal comes back as it is and leaves no trace', async () => {
  const done = await inTransaction(async (tx): Promise<Result<string, 'too_late'>> => {
    await write('refused', tx)
    return refuse('too_late')
  })
  expect(done).toEqual(refuse('too_late'))
  expect(await named('refused')).toBe(0)
})

test('a bug is thrown on and leaves no trace', async () => {
  const broken = inTransaction(async (tx) => {
    await write('thrown', tx)
    throw new RangeError('wrong')
  })
  await expect(broken).rejects.toThrow(RangeError)
  expect(await named('thrown')).toBe(0)
})

test('two that lock each other out both get through', async () => {
  const [one, two] = [await makePerson({ name: 'one' }), await makePerson({ name: 'two' })]
  let tries = 0
  let bothHold!: () => void
  const waiting = new Promise<void>((resolve) => (bothHold = resolve))
  let holders = 0
  const rename = (first: Person, second: Person) =>
    inTransaction(async (tx) => {
      tries += 1
      await Person.update({ name: 'renamed' }, { where: { id: first.id }, transaction: tx })
      if ((holders += 1) >= 2) bothHold()
      await waiting
      await Person.update({ name: 'renamed' }, { where: { id: second.id }, transaction: tx })
      return ok(null)
    })
  expect(await Promise.all([rename(one, two), rename(two, one)])).toEqual([ok(null), ok(null)])
  expect(tries).toBeGreaterThanOrEqual(3)
})

test('a serialization failure is repeated five times in all, then thrown', async () => {
  let tries = 0
  const hopeless = inTransaction(async (tx) => {
    tries += 1
    await sequelize.query(`do $$ begin raise exception 'again' using errcode = '40001'; end $$`, {
      transaction: tx,
    })
    return ok(null)
  })
  await expect(hopeless).rejects.toThrow('again')
  expect(tries).toBe(5)
})

test('any other error of the database is not repeated', async () => {
  let tries = 0
  const wrong = inTransaction(async (tx) => {
    tries += 1
    await sequelize.query('select 1 / 0', { transaction: tx })
    return ok(null)
  })
  await expect(wrong).rejects.toThrow('division by zero')
  expect(tries).toBe(1)
})
