import 'server-only'
import { QueryTypes } from 'sequelize'
import { env } from '@/lib/config/env'
import { sequelize } from '@/lib/db/sequelize'

const FRESH_FOR_MS = 1000
let seen: { offsetMs: number; at: number } | undefined

/**
 * Business time: real time plus the forward-only offset kept in the database, so that web, worker and the
 * fake provider agree. Locks, rate limits and signatures use real time instead.
 */
async function now(): Promise<Date> {
  return new Date(Date.now() + (await offsetMs()))
}

/** Moves business time forward by whole or part hours; sandbox only. Gives back the new time. */
async function advance(hours: number): Promise<Date> {
  if (!env().SANDBOX) throw new Error('The clock moves by hand in the sandbox only.')
  if (!(hours > 0 && Number.isFinite(hours)))
    throw new RangeError(`advance: hours must be above 0, got ${hours}`)
  await sequelize.query('update clock_offset set offset_ms = offset_ms + :ms', {
    replacements: { ms: Math.round(hours * 3_600_000) },
  })
  seen = undefined
  return now()
}

/**
 * Begins business time at an instant of the past, so that a demo can act through its own history; sandbox only, and
 * only while nobody is known yet: the database refuses it later.
 */
async function beginAt(instant: Date): Promise<void> {
  if (!env().SANDBOX) throw new Error('The clock moves by hand in the sandbox only.')
  await sequelize.query('update clock_offset set offset_ms = :ms', {
    replacements: { ms: Math.round(instant.getTime() - Date.now()) },
  })
  seen = undefined
}

async function offsetMs(): Promise<number> {
  // A test moves the clock and asks at once; a second's delay would make it flaky.
  if (env().NODE_ENV !== 'test' && seen && Date.now() - seen.at < FRESH_FOR_MS) return seen.offsetMs
  const rows = await sequelize.query<{ offset_ms: string | number }>('select offset_ms from clock_offset', {
    type: QueryTypes.SELECT,
  })
  seen = { offsetMs: Number(rows[0]?.offset_ms ?? 0), at: Date.now() }
  return seen.offsetMs
}

export const clock = { now, advance, beginAt }
