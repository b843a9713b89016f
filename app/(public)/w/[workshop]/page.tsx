import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { cache } from 'react'
import { MakerSheet } from '@/components/module/maker-sheet'
import { ModuleCards } from '@/components/module/module-card'
import { PublicFrame } from '@/components/site/public-frame'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { Notice } from '@/components/ui/notice'
import { PageHead } from '@/components/ui/page-head'
import { Sheet } from '@/components/ui/sheet'
import { env } from '@/lib/config/env'
import { businessNow } from '@/lib/http/business-now'
import { publicWords as words } from '@/lib/messages/public'
import { paths } from '@/lib/paths'
import { getWorkshopFront } from '@/lib/queries/public/get-workshop-front'

export const dynamic = 'force-static'
export const dynamicParams = true
export const revalidate = false
export const generateStaticParams = () => []

type Props = { params: Promise<{ workshop: string }> }

const load = cache(async (slug: string) => getWorkshopFront({ slug, now: await businessNow() }))

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { workshop } = await params
  const front = await load(workshop)
  return front
    ? { title: front.maker.name, alternates: { canonical: `${env().BASE_URL}${paths.workshop(workshop)}` } }
    : {}
}

export default async function WorkshopPage({ params }: Props) {
  const front = await load((await params).workshop)
  if (!front) notFound()
  return (
    <PublicFrame>
      <PageHead title={front.maker.name} />
      <Stack>
        {front.isOpen ? null : (
          <Notice kind="attention" title={words.suspendedTitle}>
            {words.suspended}
          </Notice>
        )}
        <Sheet title={words.workshopModules}>
          {front.modules.length > 0 ? (
            <ModuleCards cards={front.modules} />
          ) : (
            <Empty>{words.noModules}</Empty>
          )}
        </Sheet>
        <MakerSheet maker={front.maker} record={front.record} isOwnPage />
      </Stack>
    </PublicFrame>
  )
}
