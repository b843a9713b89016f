import { Empty } from '@/components/ui/empty'
import { Sheet } from '@/components/ui/sheet'
import type { SiteFront } from '@/lib/contracts/module-page'
import { publicWords as words } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

/** Every open workshop with how many modules it shows. */
export function WorkshopList({ workshops }: Pick<SiteFront, 'workshops'>) {
  return (
    <Sheet title={words.workshopsTitle}>
      {workshops.length === 0 ? (
        <Empty>{words.noWorkshops}</Empty>
      ) : (
        <ul className="border-t border-rule">
          {workshops.map(({ slug, name, modules }) => (
            <li
              key={slug}
              className="flex flex-wrap items-baseline justify-between gap-x-6 border-b border-rule py-2"
            >
              <a href={paths.workshop(slug)} className="inline-flex min-h-6 items-center">
                {name}
              </a>
              <span className="text-15 text-quiet">{words.modulesOf(modules)}</span>
            </li>
          ))}
        </ul>
      )}
    </Sheet>
  )
}
