'use client'

import { usePathname } from 'next/navigation'
import { type FrameLink, LinkList } from './link-list'

/** The address a page belongs under: the longest of the links that leads to it or to a page above it. */
function currentOf(links: readonly { href: string }[], pathname: string): string | undefined {
  return links
    .map(({ href }) => href)
    .filter((href) => pathname === href || pathname.startsWith(`${href}/`))
    .sort((a, b) => b.length - a.length)[0]
}

/** Links of a frame that stays while pages change under it: marks the one the page belongs under. */
export function CurrentLinks({ links }: { links: readonly FrameLink[] }) {
  const current = currentOf(links, usePathname())
  return <LinkList links={links.map((link) => ({ ...link, current: link.href === current }))} />
}
