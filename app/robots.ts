import type { MetadataRoute } from 'next'
import { env } from '@/lib/config/env'

export const dynamic = 'force-dynamic'

/** Pages of people and of links from mails are nobody's to index. */
export default function robots(): MetadataRoute.Robots {
  return {
    rules: {
      userAgent: '*',
      allow: '/',
      disallow: ['/api/', '/account', '/admin/', '/packing/', '/bench/', '/host', '/sandbox', '/confirm/'],
    },
    sitemap: `${env().BASE_URL}/sitemap.xml`,
  }
}
