import { Tabs } from '@/components/ui/tabs'
import { moneyWords } from '@/lib/messages/money-desk'
import { runWords as words } from '@/lib/messages/runs'
import { unitWords } from '@/lib/messages/units'
import { paths } from '@/lib/paths'

type Props = {
  workshop: string
  run: string
  current:
    | 'run'
    | 'demand'
    | 'costs'
    | 'what-ifs'
    | 'schedule'
    | 'orders'
    | 'units'
    | 'money'
    | 'outcome'
}

/** The pages of a run, side by side. */
export function RunTabs({ workshop, run, current }: Props) {
  return (
    <Tabs
      label={words.pages}
      tabs={[
        { href: paths.adminRun(workshop, run), label: words.decision, current: current === 'run' },
        {
          href: paths.adminRunPage(workshop, run, 'demand'),
          label: words.demandTitle,
          current: current === 'demand',
        },
        {
          href: paths.adminRunPage(workshop, run, 'costs'),
          label: words.costsTitle,
          current: current === 'costs',
        },
        {
          href: paths.adminRunPage(workshop, run, 'what-ifs'),
          label: words.whatIfsTitle,
          current: current === 'what-ifs',
        },
        {
          href: paths.adminRunPage(workshop, run, 'schedule'),
          label: words.scheduleTitle,
          current: current === 'schedule',
        },
        {
          href: paths.adminRunPage(workshop, run, 'orders'),
          label: words.ordersTitle,
          current: current === 'orders',
        },
        {
          href: paths.adminRunUnits(workshop, run),
          label: unitWords.title,
          current: current === 'units',
        },
        {
          href: paths.adminRunPage(workshop, run, 'money'),
          label: moneyWords.title,
          current: current === 'money',
        },
        {
          href: paths.adminRunPage(workshop, run, 'outcome'),
          label: words.outcomeTitle,
          current: current === 'outcome',
        },
      ]}
    />
  )
}
