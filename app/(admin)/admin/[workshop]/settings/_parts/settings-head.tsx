import { PageHead } from '@/components/ui/page-head'
import { Tabs } from '@/components/ui/tabs'
import { settingsWords as words } from '@/lib/messages/settings'
import { paths } from '@/lib/paths'

const PAGES = ['details', 'postage', 'destinations', 'terms', 'members'] as const
type SettingsPage = (typeof PAGES)[number]

/** The top of each page of the settings, with the way to the others. */
export function SettingsHead({ slug, page, lead }: { slug: string; page: SettingsPage; lead?: string }) {
  return (
    <>
      <PageHead title={page === 'details' ? words.title : words.pages[page]} lead={lead ?? words.lead} />
      <Tabs
        label={words.navigation}
        tabs={PAGES.map((each) => ({
          href: each === 'details' ? paths.adminSettings(slug) : paths.adminSettingsPage(slug, each),
          label: words.pages[each],
          current: each === page,
        }))}
      />
    </>
  )
}
