import type { Metadata } from 'next'
import { notFound } from 'next/navigation'
import { PageHead } from '@/components/ui/page-head'
import { SiteFrame } from '@/components/ui/site-frame'
import { env } from '@/lib/config/env'
import { Drawings } from './_parts/drawings'
import { Fields } from './_parts/fields'
import { Figures } from './_parts/figures'
import { Lists } from './_parts/lists'
import { Marks } from './_parts/marks'
import { Tables } from './_parts/tables'

export const metadata: Metadata = { title: 'Pieces', robots: { index: false } }
export const dynamic = 'force-dynamic'

type Search = Promise<{ theme?: string; bench?: string }>

/** Every piece in every state, for looking at; `?theme=light|dark` and `?bench=1` change what they stand in. */
export default async function PiecesPage({ searchParams }: { searchParams: Search }) {
  if (!env().SANDBOX) notFound()
  const { theme, bench } = await searchParams
  const links = [
    { href: '/sandbox/pieces', label: 'As the system asks', current: !theme && !bench },
    { href: '/sandbox/pieces?theme=light', label: 'Light', current: theme === 'light' },
    { href: '/sandbox/pieces?theme=dark', label: 'Dark', current: theme === 'dark' },
    { href: '/sandbox/pieces?bench=1', label: 'At the bench', current: Boolean(bench) },
  ]
  return (
    <div data-theme={theme === 'light' || theme === 'dark' ? theme : undefined} className="bg-paper text-ink">
      <SiteFrame
        links={links}
        bench={Boolean(bench)}
        account={<a href="/signin">Sign in</a>}
        banner="This is a demonstration. Nothing here is real."
        titleBlock={{
          what: 'Pieces',
          revision: 'A',
          who: 'Brimline',
          when: '3 March 2027',
          sheet: { number: 1, of: 1 },
        }}
      >
        <PageHead
          title="Pieces"
          lead="Everything a page is made of, in every state."
          trail={[{ href: '/sandbox', label: 'Sandbox' }]}
        />
        <div className="flex flex-col gap-8">
          <Drawings />
          <Marks />
          <Fields />
          <Tables />
          <Lists />
          <Figures />
        </div>
      </SiteFrame>
    </div>
  )
}
