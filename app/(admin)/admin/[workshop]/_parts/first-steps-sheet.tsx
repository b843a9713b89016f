import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import type { Desk, FirstStep } from '@/lib/contracts/workshops'
import { deskWords as words } from '@/lib/messages/desk'
import { paths } from '@/lib/paths'

const hints: Partial<Record<FirstStep, string>> = words.stepHints

/** The check list of a new workshop: each line with its state and the way to where it is done. */
export function FirstStepsSheet({ desk }: { desk: Desk }) {
  const open = desk.steps.filter(({ done }) => !done).length
  return (
    <Sheet
      id="first-steps"
      title={words.stepsTitle}
      aside={open === 0 ? words.stepsDone : words.stepsLeft(open)}
    >
      <p className="pb-3 text-quiet">{words.stepsLead}</p>
      <ol className="border-t border-rule">
        {desk.steps.map(({ key, done }) => (
          <li
            key={key}
            className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule py-2"
          >
            <a href={whereTo(key, desk)} className="inline-flex min-h-6 items-center">
              {words.steps[key]}
            </a>
            <StateMark kind={done ? 'done' : 'open'}>{done ? words.stepDone : words.stepOpen}</StateMark>
            {!done && hints[key] ? <p className="w-full text-13 text-quiet">{hints[key]}</p> : null}
          </li>
        ))}
      </ol>
    </Sheet>
  )
}

function whereTo(step: FirstStep, { workshop: { slug }, firstModule }: Desk): string {
  const ofModule = (page: 'offers' | 'revisions' | 'plan') =>
    firstModule ? paths.adminModulePage(slug, firstModule, page) : paths.adminModuleNew(slug)
  const ways: Record<FirstStep, string> = {
    account: paths.adminPaymentAccount(slug),
    details: paths.adminSettings(slug),
    terms: paths.adminSettingsPage(slug, 'terms'),
    postage: paths.adminSettingsPage(slug, 'postage'),
    module: firstModule ? paths.adminModule(slug, firstModule) : paths.adminModuleNew(slug),
    offers: ofModule('offers'),
    revision: ofModule('revisions'),
    first_unit: ofModule('revisions'),
    plan: ofModule('plan'),
    packer: paths.adminSettingsPage(slug, 'members'),
    publish: firstModule ? paths.adminModule(slug, firstModule) : paths.adminModuleNew(slug),
  }
  return ways[step]
}
