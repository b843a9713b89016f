import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { StructuredData } from '@/components/module/structured-data'
import { PublicFrame } from '@/components/site/public-frame'
import { PageHead } from '@/components/ui/page-head'
import { env } from '@/lib/config/env'
import { paths } from '@/lib/paths'
import { loadModule } from './_parts/load-module'
import { ModuleSheets } from './_parts/module-sheets'

// Kept until a service says that it changed; made on the first visit, never at build time.
export const dynamic = 'force-static'
export const dynamicParams = true
export const revalidate = false
export const generateStaticParams = () => []

type Props = { params: Promise<{ workshop: string; module: string }> }

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { workshop, module } = await params
  const page = await loadModule(workshop, module)
  if (!page) return {}
  const url = `${env().BASE_URL}${paths.module(workshop, module)}`
  const { name: title, oneLine: description } = page.module
  return {
    title: `${title} · ${page.workshop.name}`,
    description,
    alternates: { canonical: url },
    openGraph: { title, description, url, type: 'website' },
  }
}

export default async function ModulePage({ params }: Props) {
  const { workshop, module } = await params
  const page = await loadModule(workshop, module)
  if (!page) notFound()
  return (
    <PublicFrame>
      <StructuredData page={page} baseUrl={env().BASE_URL} />
      <PageHead
        trail={[{ href: paths.workshop(workshop), label: page.workshop.name }]}
        title={page.module.name}
        lead={page.module.oneLine}
      />
      <ModuleSheets page={page} />
    </PublicFrame>
  )
}
