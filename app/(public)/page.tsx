import type { Metadata } from 'next'
import { ModuleCards } from '@/components/module/module-card'
import { PublicFrame } from '@/components/site/public-frame'
import { LinkButton } from '@/components/ui/button'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { env, isBuilding } from '@/lib/config/env'
import { businessNow } from '@/lib/http/business-now'
import { publicWords as words } from '@/lib/messages/public'
import { paths } from '@/lib/paths'
import { getSiteFront } from '@/lib/queries/public/get-site-front'
import { HowItWorks } from './_parts/how-it-works'
import { WorkshopList } from './_parts/workshop-list'

export const dynamic = 'force-static'
export const revalidate = false

// A build has no database; what it writes is made anew by the first visit.
const NOTHING = { modules: [], workshops: [] }
const load = async () => (isBuilding() ? NOTHING : getSiteFront({ now: await businessNow() }))

export function generateMetadata(): Metadata {
  return {
    description: words.frontLead,
    ...(!isBuilding() && { alternates: { canonical: `${env().BASE_URL}${paths.home}` } }),
  }
}

export default async function FrontPage() {
  const { modules, workshops } = await load()
  return (
    <PublicFrame>
      <PageHead title={words.frontTitle} lead={words.frontLead} />
      <Stack>
        <Sheet title={words.modulesTitle}>
          {modules.length > 0 ? (
            <ModuleCards cards={modules} showWorkshop />
          ) : (
            <Empty>{words.noModules}</Empty>
          )}
        </Sheet>
        <HowItWorks />
        <WorkshopList workshops={workshops} />
        <Sheet title={words.makersTitle}>
          <p className="max-w-words pb-4">{words.makersLead}</p>
          <LinkButton href={paths.start}>{words.startWorkshop}</LinkButton>
        </Sheet>
      </Stack>
    </PublicFrame>
  )
}
