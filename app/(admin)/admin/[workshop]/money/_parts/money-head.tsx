import { PageHead } from '@/components/ui/page-head'
import { Tabs } from '@/components/ui/tabs'
import { moneyWords as words } from '@/lib/messages/money-desk'
import { paths } from '@/lib/paths'

type Props = { slug: string; current: 'books' | 'invoices' | 'tax'; lead: string }

/** The head of the pages about money, with the way between them. */
export function MoneyHead({ slug, current, lead }: Props) {
  return (
    <>
      <PageHead title={words.title} lead={lead} />
      <Tabs
        label={words.pages}
        tabs={[
          { href: paths.adminMoney(slug, 'books'), label: words.books, current: current === 'books' },
          {
            href: paths.adminMoney(slug, 'invoices'),
            label: words.invoices,
            current: current === 'invoices',
          },
          { href: paths.adminMoney(slug, 'tax'), label: words.tax, current: current === 'tax' },
        ]}
      />
    </>
  )
}
