import 'server-only'
import { QueryTypes } from 'sequelize'
import { sequelize } from '@/lib/db/sequelize'

/** A sitemap holds 50,000 addresses at most. */
const MOST = 40_000

/** Every open workshop with the slugs of its published modules, for the sitemap. One statement. */
export function listPublicPages(): Promise<{ workshop: string; modules: string[] }[]> {
  return sequelize.query(
    `select w.slug as workshop, coalesce(array_agg(m.slug order by m.slug) filter (where m.id is not null), '{}') as modules
     from workshops w left join modules m on m.workshop_id = w.id and m.state = 'published'
     where w.state = 'open' group by w.id order by w.slug limit :most`,
    { replacements: { most: MOST }, type: QueryTypes.SELECT },
  )
}
