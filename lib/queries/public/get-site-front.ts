import 'server-only'
import { QueryTypes } from 'sequelize'
import type { SiteFront } from '@/lib/contracts/module-page'
import { sequelize } from '@/lib/db/sequelize'
import { listModuleCards } from './list-module-cards'

/** The front of the site: open workshops and their modules. Three statements. */
export async function getSiteFront(cmd: { now: Date }): Promise<SiteFront> {
  const workshops = await sequelize.query<SiteFront['workshops'][number]>(
    `select w.slug, w.name, w.about, count(m.id)::int as modules
     from workshops w left join modules m on m.workshop_id = w.id and m.state = 'published'
     where w.state = 'open' group by w.id order by count(m.id) desc, w.name limit 200`,
    { type: QueryTypes.SELECT },
  )
  return { modules: await listModuleCards(cmd), workshops }
}
