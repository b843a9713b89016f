import { sequelize } from '@/lib/db/sequelize'
import { RATES_FROM, RATES_SOURCE, STANDARD_RATES } from './tax-rates'

/** Writes the data every environment starts from. Repeatable: what is there already stays as it is. */
export async function seedReference(): Promise<void> {
  const rates = Object.entries(STANDARD_RATES).map(([country, basisPoints]) => ({ country, basisPoints }))
  await sequelize.query(
    `insert into tax_rates (country, basis_points, valid_from, source)
     select country, "basisPoints", :from, :source
     from jsonb_to_recordset(:rates::jsonb) as given (country text, "basisPoints" int)
     on conflict (workshop_id, country, tax_class, valid_from) do nothing`,
    { replacements: { rates: JSON.stringify(rates), from: RATES_FROM, source: RATES_SOURCE } },
  )
}
