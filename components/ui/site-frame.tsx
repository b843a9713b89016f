import { paths } from '@/lib/paths'
import { ui } from '@/lib/messages/ui'
import { TitleBlock, type TitleBlockProps } from './title-block'
import { WordMark } from './word-mark'

export type FrameLink = { href: string; label: React.ReactNode; current?: boolean }

type Props = {
  links?: readonly FrameLink[]
  /** Right of the links: who is signed in, a way to sign in or out. */
  account?: React.ReactNode
  /** A line above everything: a notice that this is a demonstration, say. */
  banner?: React.ReactNode
  titleBlock?: TitleBlockProps
  footLinks?: readonly FrameLink[]
  /** Larger targets, for a tablet beside the work. */
  bench?: boolean
  children: React.ReactNode
}

const legal: readonly FrameLink[] = [
  { href: paths.terms, label: ui.terms },
  { href: paths.privacy, label: ui.privacy },
  { href: paths.accessibility, label: ui.accessibility },
]

/** What stands around every page: skip link, word mark with its brim line, navigation, content, title block. */
export function SiteFrame({
  links = [],
  account,
  banner,
  titleBlock,
  footLinks = legal,
  bench,
  children,
}: Props) {
  return (
    <div
      data-bench={bench ? '' : undefined}
      className="max-w-page mx-auto flex min-h-dvh flex-col px-4 sm:px-6"
    >
      <a
        href="#main"
        className="focus:bg-sheet sr-only focus:not-sr-only focus:fixed focus:top-2 focus:left-2 focus:z-10 focus:p-3 print:hidden"
      >
        {ui.skipToContent}
      </a>
      <header className="pb-6 print:hidden">
        {banner ? <div className="border-rule text-13 border-b py-1.5 print:hidden">{banner}</div> : null}
        <div className="flex items-baseline gap-1 pt-4">
          <WordMark />
          <span className="brim font-heading text-28" aria-hidden="true" />
          {account ? <div className="text-15 pl-3">{account}</div> : null}
        </div>
        {links.length > 0 ? (
          <nav aria-label={ui.mainNavigation} className="mt-1">
            <LinkList links={links} />
          </nav>
        ) : null}
      </header>
      <main id="main" tabIndex={-1} className="grow pb-12">
        {children}
      </main>
      <footer className="border-ink border-b-2 print:hidden">
        {footLinks.length > 0 ? (
          <nav aria-label={ui.legalNavigation} className="pb-1">
            <LinkList links={footLinks} />
          </nav>
        ) : null}
        {titleBlock ? <TitleBlock {...titleBlock} /> : null}
      </footer>
    </div>
  )
}

function LinkList({ links }: { links: readonly FrameLink[] }) {
  return (
    <ul className="text-15 -mx-2 flex flex-wrap gap-x-2">
      {links.map((link) => (
        <li key={link.href}>
          <a
            href={link.href}
            aria-current={link.current ? 'page' : undefined}
            className={`bench:min-h-14 inline-flex min-h-11 items-center px-2 ${link.current ? 'text-ink font-semibold decoration-2' : ''}`}
          >
            {link.label}
          </a>
        </li>
      ))}
    </ul>
  )
}
