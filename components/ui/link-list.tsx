export type FrameLink = { href: string; label: React.ReactNode; current?: boolean }

/** Links of a page's frame in a row; the one that is being looked at says so. */
export function LinkList({ links }: { links: readonly FrameLink[] }) {
  return (
    <ul className="-mx-2 flex flex-wrap gap-x-2 text-15">
      {links.map((link) => (
        <li key={link.href}>
          <a
            href={link.href}
            aria-current={link.current ? 'page' : undefined}
            className={`inline-flex min-h-11 items-center px-2 bench:min-h-14 ${link.current ? 'font-semibold text-ink decoration-2' : ''}`}
          >
            {link.label}
          </a>
        </li>
      ))}
    </ul>
  )
}
