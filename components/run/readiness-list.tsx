import { StateMark, type MarkKind } from '@/components/ui/state-mark'
import type { ReadinessKey, ReadinessState } from '@/lib/core/states/run-readiness'
import { readinessStates } from '@/lib/messages/readiness'
import { runWords } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'

type Line = { key: ReadinessKey; state: ReadinessState; title: string; words: string }
type Props = { lines: readonly Line[]; workshop: string; module: string }

const MARKS: Readonly<Record<ReadinessState, MarkKind>> = {
  ready: 'done',
  waived: 'open',
  missing: 'stopped',
  unknown: 'attention',
}

/** Where what a line lacks is entered. */
function mendHref(key: ReadinessKey, workshop: string, module: string): string {
  switch (key) {
    case 'first_good_unit':
    case 'lessons':
      return paths.adminModulePage(workshop, module, 'revisions')
    case 'quotes':
    case 'samples':
    case 'parts_list':
      return paths.adminModulePage(workshop, module, 'parts')
    case 'post_data':
      return paths.adminModulePage(workshop, module, 'offers')
    case 'promise':
      return paths.adminModulePage(workshop, module, 'plan')
    case 'page':
      return paths.adminSettings(workshop)
    case 'repay':
      return paths.adminPaymentAccount(workshop)
  }
}

/** The nine lines before a lock: each with its state, a sentence, and where to mend it. */
export function ReadinessList({ lines, workshop, module }: Props) {
  return (
    <ol className="border-t border-rule">
      {lines.map(({ key, state, title, words }) => (
        <li
          key={key}
          className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 border-b border-rule py-2.5 sm:grid-cols-[10rem_minmax(0,1fr)_auto]"
        >
          <h3 className="text-15 font-semibold">{title}</h3>
          <p className="order-3 col-span-2 max-w-words text-15 sm:order-none sm:col-span-1">
            {words}
            {state === 'ready' ? null : (
              <>
                {' '}
                <a href={mendHref(key, workshop, module)} className="inline-flex min-h-6">
                  {runWords.mend} <span className="sr-only">{title}</span>
                </a>
              </>
            )}
          </p>
          <span className="text-right text-13">
            <StateMark kind={MARKS[state]}>{readinessStates[state]}</StateMark>
          </span>
        </li>
      ))}
    </ol>
  )
}
