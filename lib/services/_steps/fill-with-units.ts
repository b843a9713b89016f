import 'server-only'
import type { Transaction } from 'sequelize'
import { moveUnit } from '@/lib/services/_steps/move-unit'
import { type Parcel, ParcelLine, type Unit } from '@/models'

/**
 * Marks what is in a parcel: a line with serial numbers becomes one row per unit, one without stays a row.
 * The caller has locked parcel and units. Writes: lines, units, audit.
 */
export async function fillWithUnits(
  tx: Transaction,
  parcel: Parcel,
  lines: readonly ParcelLine[],
  units: ReadonlyMap<string, Unit[]>,
  by: { now: Date; byPersonId: string },
): Promise<void> {
  const { workshopId, id: parcelId } = parcel
  for (const line of lines) {
    const { orderLineId } = line
    const own = units.get(orderLineId) ?? []
    if (own.length === 0) {
      await line.update({ tickedAt: by.now }, { transaction: tx })
      continue
    }
    await line.destroy({ transaction: tx })
    for (const unit of own) {
      const taken = await moveUnit(tx, unit, 'allocate', { ...by, orderLineId })
      if (!taken.ok) throw new Error(`unit ${unit.id} cannot be allocated from ${unit.state}`)
      await ParcelLine.create(
        { workshopId, parcelId, orderLineId, quantity: 1, unitId: unit.id, tickedAt: by.now },
        { transaction: tx },
      )
    }
  }
}
