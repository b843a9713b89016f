import { classNames } from './class-names'

type Tab = { href: string; label: React.ReactNode; current?: boolean; count?: React.ReactNode }

/** Pages of one thing side by side: links, so that each has an address. */
export function Tabs({ label, tabs }: { label: string; tabs: readonly Tab[] }) {
  return (
    <nav aria-label={label} className="border-ink mb-6 border-b print:hidden">
      <ul className="flex flex-wrap gap-x-1">
        {tabs.map((tab) => (
          <li key={tab.href}>
            <a
              href={tab.href}
              aria-current={tab.current ? 'page' : undefined}
              className={classNames(
                'text-15 bench:min-h-14 -mb-px inline-flex min-h-11 items-center gap-1.5 border-b-3 px-3 no-underline',
                tab.current ? 'border-tide text-ink font-semibold' : 'border-transparent hover:underline',
              )}
            >
              {tab.label}
              {tab.count === undefined ? null : <span className="figures text-quiet">{tab.count}</span>}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  )
}
