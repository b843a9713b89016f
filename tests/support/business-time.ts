import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/**
 * Sets business time to an instant, backwards too: the worlds of the tests begin at a fixed morning, and the sandbox's
 * provider follows the clock of the database.
 */
export async function setBusinessTime(at: Date): Promise<void> {
  await sequelize.transaction(async (transaction) => {
    await sequelize.query('alter table clock_offset disable trigger user', { transaction })
    await sequelize.query('update clock_offset set offset_ms = :ms', {
      replacements: { ms: at.getTime() - Date.now() },
      transaction,
    })
    await sequelize.query('alter table clock_offset enable trigger user', { transaction })
  })
}

/** Business time as the database has it. */
export async function businessTime(): Promise<Date> {
  const [row] = await sequelize.query<{ ms: number }>('select offset_ms as ms from clock_offset', {
    type: QueryTypes.SELECT,
  })
  return new Date(Date.now() + Number(row?.ms ?? 0))
}

export const minutesLater = (at: Date, minutes: number) => new Date(at.getTime() + minutes * 60_000)
