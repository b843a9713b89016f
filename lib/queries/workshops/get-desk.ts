import 'server-only'
import { QueryTypes } from 'sequelize'
import { FIRST_STEPS, type Desk, type FirstStep } from '@/lib/contracts/workshops'
import { can, type Actor } from '@/lib/core/policy/can'
import { sequelize } from '@/lib/db/sequelize'
import { Workshop } from '@/models'

/** An owner's desk; null when the actor may not see it. Three queries. */
export async function getDesk(cmd: { actor: Actor; slug: string }): Promise<Desk | null> {
  const workshop = await Workshop.findOne({ where: { slug: cmd.slug } })
  if (!workshop || !can(cmd.actor, 'workshop:read', { workshopId: workshop.id })) return null
  const given = { replacements: { id: workshop.id }, type: QueryTypes.SELECT as const }
  const [found] = await sequelize.query<Record<FirstStep, boolean> & { firstModule: string | null }>(
    STEPS,
    given,
  )
  const runs = await sequelize.query<Desk['runs'][number]>(RUNS, given)
  return {
    workshop: {
      id: workshop.id,
      slug: workshop.slug,
      locale: workshop.locale,
      name: workshop.name,
      state: workshop.state,
      currency: workshop.currency,
      chargesEnabled: workshop.chargesEnabledAt !== null,
    },
    steps: FIRST_STEPS.map((key) => ({ key, done: found?.[key] ?? false })),
    firstModule: found?.firstModule ?? null,
    runs,
  }
}

const STEPS = `
  select w.charges_enabled_at is not null as account,
         w.postal_address is not null as details,
         exists (select 1 from terms_versions t where t.workshop_id = w.id) as terms,
         exists (select 1 from postage_zones z where z.workshop_id = w.id) as postage,
         exists (select 1 from modules m where m.workshop_id = w.id) as module,
         exists (select 1 from offers o where o.workshop_id = w.id and o.withdrawn_at is null) as offers,
         exists (select 1 from revisions r where r.workshop_id = w.id) as revision,
         exists (select 1 from revisions r where r.workshop_id = w.id and r.first_good_at is not null) as first_unit,
         exists (select 1 from plans p where p.workshop_id = w.id and p.run_id is null) as plan,
         exists (select 1 from memberships s where s.workshop_id = w.id and s.role = 'packer' and s.ended_at is null)
           as packer,
         exists (select 1 from modules m where m.workshop_id = w.id and m.published_at is not null) as publish,
         (select m.slug from modules m where m.workshop_id = w.id order by m.created_at, m.slug limit 1) as "firstModule"
  from workshops w where w.id = :id`

const RUNS = `
  select r.id, m.name as module, r.state, r.minimum, r.maximum, r.committed_units as committed,
         r.decide_by_on::text as "decideBy"
  from runs r join modules m on m.id = r.module_id
  where r.workshop_id = :id and r.state in ('draft', 'taking_deposits', 'locked')
  order by r.decide_by_on, m.name, r.number limit 50`
