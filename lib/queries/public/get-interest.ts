import 'server-only'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'
import type { Module } from '@/models'

const FEW = 10

/** Confirmed sign-ups of a module and the units they ask for; null while the owner hides them. One statement. */
export async function getInterest(module: Module): Promise<{ confirmed: number; units: number } | null> {
  const [counts] = await sequelize.query<{ confirmed: number; units: number }>(
    `select count(*)::int as confirmed, coalesce(sum(quantity), 0)::int as units
     from signups where module_id = :moduleId and state = 'confirmed'`,
    { replacements: { moduleId: module.id }, type: QueryTypes.SELECT },
  )
  const { confirmed, units } = counts!
  return module.hideInterestBelowTen && confirmed < FEW ? null : { confirmed, units }
}
