import { DatabaseError } from 'sequelize'

/** Name of the constraint (or, for a trigger without one, the message) by which the database refuses; fails when it does not. */
export async function refusedBy(change: () => Promise<unknown>): Promise<string> {
  try {
    await change()
  } catch (error) {
    const parent = error instanceof Error && 'parent' in error ? (error.parent as Error) : error
    if (parent instanceof DatabaseError || !(parent instanceof Error)) throw error
    const { constraint } = parent as Error & { constraint?: string }
    return constraint ?? parent.message
  }
  throw new Error('the database accepted it')
}
