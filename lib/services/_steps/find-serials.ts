import 'server-only'
import type { Transaction } from 'sequelize'
import type { PackInput } from '@/lib/contracts/packing'
import { packingMistakes as words } from '@/lib/messages/packing'
import { type OrderLine, Unit } from '@/models'

type Found = { units: Map<string, Unit[]>; errors: Record<string, string> }

/**
 * The units behind the serial numbers of each line, locked, and what is wrong with a number, by field: unknown in this run
 * and form, not passed, of another order, or named twice. Numbers are read without regard to case.
 * Locks: the units. Writes: nothing.
 */
export async function findSerials(
  tx: Transaction,
  lines: readonly OrderLine[],
  runId: string,
  given: PackInput['lines'],
): Promise<Found> {
  const units = new Map<string, Unit[]>()
  const errors: Record<string, string> = {}
  const seen = new Set<string>()
  const known = given.some(({ serials }) => serials?.length)
    ? await lockUnits(tx, runId)
    : new Map<string, Unit>()
  for (const [i, { line: id, serials = [] }] of given.entries()) {
    const line = lines.find((each) => each.id === id)
    for (const serial of serials) {
      const unit = known.get(serial.toUpperCase())
      const mistake =
        !unit || unit.offerKind !== line?.offerKind
          ? words.serialUnknown(serial)
          : seen.has(unit.id)
            ? words.serialTwice(serial)
            : mistakeOf(unit, serial)
      if (mistake) errors[`lines.${i}.serials`] ??= mistake
      if (!unit) continue
      seen.add(unit.id)
      units.set(id, [...(units.get(id) ?? []), unit])
    }
  }
  return { units, errors }
}

function mistakeOf(unit: Unit, serial: string): string | null {
  if (unit.state === 'passed') return null
  return unit.orderLineId === null ? words.serialNotPassed(serial) : words.serialElsewhere(serial)
}

/** A run has some hundreds of units at most; locking them together in one order keeps two packers from waiting crosswise. */
async function lockUnits(tx: Transaction, runId: string): Promise<Map<string, Unit>> {
  const units = await Unit.findAll({
    where: { runId },
    order: [['id', 'ASC']],
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  })
  return new Map(units.map((unit) => [unit.serial.toUpperCase(), unit]))
}
