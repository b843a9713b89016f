import { LinkButton } from '@/components/ui/button'
import { Empty } from '@/components/ui/empty'
import { Sheet } from '@/components/ui/sheet'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Props = { workshop: string; modules: readonly { slug: string; name: string }[] }

/** Which module the run is of: links, so that the form behind each has an address. */
export function ChooseModule({ workshop, modules }: Props) {
  if (modules.length === 0)
    return (
      <Empty action={<LinkButton href={paths.adminModules(workshop)}>{words.toModules}</LinkButton>}>
        {words.noModules}
      </Empty>
    )
  return (
    <Sheet title={words.chooseModule}>
      <ul className="border-t border-rule">
        {modules.map(({ slug, name }) => (
          <li key={slug} className="border-b border-rule">
            <a
              href={`${paths.adminRunNew(workshop)}?module=${encodeURIComponent(slug)}`}
              className="inline-flex min-h-11 items-center"
            >
              {name}
            </a>
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
