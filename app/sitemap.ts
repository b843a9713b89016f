import type { MetadataRoute } from 'next'
import { env } from '@/lib/config/env'
import { paths } from '@/lib/paths'
import { listPublicPages } from '@/lib/queries/public/list-public-pages'

export const dynamic = 'force-dynamic'

export default async function sitemap(): Promise<MetadataRoute.Sitemap> {
  const pages = await listPublicPages()
  const found = pages.flatMap(({ workshop, modules }) => [
    paths.workshop(workshop),
    ...modules.map((module) => paths.module(workshop, module)),
  ])
  const always = [paths.home, paths.terms, paths.privacy, paths.accessibility]
  return [...always, ...found].map((path) => ({ url: `${env().BASE_URL}${path}` }))
}
