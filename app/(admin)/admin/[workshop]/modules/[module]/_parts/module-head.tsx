import { PageHead } from '@/components/ui/page-head'
import { StateMark } from '@/components/ui/state-mark'
import { Tabs } from '@/components/ui/tabs'
import type { ModuleDesk } from '@/lib/contracts/module-desk'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

const PAGES = ['overview', 'facts', 'offers', 'revisions', 'parts', 'plan', 'files', 'interest'] as const
const MARKS = { draft: 'open', published: 'done', archived: 'stopped' } as const

type Props = { slug: string; module: ModuleDesk['module']; page: (typeof PAGES)[number]; lead?: string }

/** The top of each page of a module, with the way to the others. */
export function ModuleHead({ slug, module, page, lead }: Props) {
  return (
    <>
      <PageHead
        title={page === 'overview' ? module.name : `${module.name}: ${words.pages[page].toLowerCase()}`}
        lead={lead ?? module.oneLine}
        trail={[{ href: paths.adminModules(slug), label: words.title }]}
        aside={<StateMark kind={MARKS[module.state]}>{words.states[module.state]}</StateMark>}
      />
      <Tabs
        label={words.navigation}
        tabs={PAGES.map((each) => ({
          href:
            each === 'overview'
              ? paths.adminModule(slug, module.slug)
              : paths.adminModulePage(slug, module.slug, each),
          label: words.pages[each],
          current: each === page,
        }))}
      />
    </>
  )
}
