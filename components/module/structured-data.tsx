import type { ModulePage } from '@/lib/contracts/module-page'
import { plainMoney } from '@/lib/core/money/plain'
import { offerWords } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

/** The module for machines that read pages (schema.org, JSON-LD); nothing in it that the page does not say. */
export function StructuredData({ page, baseUrl }: { page: ModulePage; baseUrl: string }) {
  const { workshop, module, run, maker } = page
  const url = `${baseUrl}${paths.module(workshop.slug, module.slug)}`
  const availability = run?.takesOrders && !run.isFull ? 'PreOrder' : 'OutOfStock'
  const data = {
    '@context': 'https://schema.org',
    '@type': 'Product',
    name: module.name,
    description: module.oneLine,
    url,
    brand: { '@type': 'Organization', name: maker.name, url: `${baseUrl}${paths.workshop(maker.slug)}` },
    offers: page.delivery.offers
      .filter(({ priceMinor }) => priceMinor !== null)
      .map(({ offer, priceMinor }) => ({
        '@type': 'Offer',
        name: offerWords[offer],
        price: plainMoney(priceMinor!, workshop.currency),
        priceCurrency: workshop.currency,
        availability: `https://schema.org/${availability}`,
        url,
        ...(run?.takesOrders && { priceValidUntil: run.decideBy }),
      })),
  }
  // A text of the maker's must not be able to end the element it stands in.
  const json = JSON.stringify(data).replaceAll('<', '\\u003c')
  return <script type="application/ld+json" dangerouslySetInnerHTML={{ __html: json }} />
}
