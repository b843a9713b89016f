import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import type { PartsDesk } from '@/lib/contracts/module-desk'
import { partsAdminWords as words } from '@/lib/messages/parts-admin'

const problems: Record<string, string> = words.problems

/** What would stop a run or shame a kit, before it does. */
export function PartsCheck({ parts }: { parts: PartsDesk }) {
  const { findings, lines } = parts
  return (
    <Sheet title={words.check} id="check">
      {lines.length === 0 ? <p className="text-quiet">{words.checkNothing}</p> : null}
      {lines.length > 0 && findings.length === 0 ? (
        <StateMark kind="done">{words.checkClean}</StateMark>
      ) : null}
      <ul className="flex flex-col gap-2">
        {findings.map(({ code, problem, severity, detail }) => (
          <li key={`${code} ${problem} ${detail}`} className="flex flex-wrap items-baseline gap-x-3">
            <StateMark kind={severity === 'error' ? 'stopped' : 'attention'}>
              {words.severity[severity]}
            </StateMark>
            <span className="font-semibold">{code ?? words.wholeList}</span>
            <span>{problems[problem]}</span>
            <span className="figures text-quiet">{detail}</span>
          </li>
        ))}
      </ul>
    </Sheet>
  )
}
