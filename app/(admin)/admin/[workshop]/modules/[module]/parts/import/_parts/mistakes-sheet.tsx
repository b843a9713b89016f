import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import type { ImportPreview } from '@/lib/contracts/part-import'
import { importWords as words } from '@/lib/messages/part-imports'
import { partsAdminWords } from '@/lib/messages/parts-admin'

const PROBLEMS: Record<string, string> = partsAdminWords.problems
const MOST_SHOWN = 200

const where = (line: number | null) => (line === null ? words.wholeFile : words.line(line))

/** What keeps a file from being saved, and what the check would find in it, each at its line. */
export function MistakesSheet({ preview: { problems, findings } }: { preview: ImportPreview }) {
  return (
    <>
      {problems.length === 0 ? (
        <StateMark kind="done">{words.noMistakes}</StateMark>
      ) : (
        <Sheet title={words.mistakes} id="mistakes">
          <p className="max-w-words pb-3 text-quiet">{words.mistakesLead}</p>
          <Lines
            rows={problems.map(({ line, column, words: sentence }) => ({
              ...{ mark: 'stopped' as const, said: partsAdminWords.severity.error },
              ...{ where: where(line), what: column, sentence, detail: '' },
            }))}
          />
        </Sheet>
      )}
      {findings.length > 0 ? (
        <Sheet title={words.findings} id="findings">
          <p className="max-w-words pb-3 text-quiet">{words.findingsLead}</p>
          <Lines
            rows={findings.map(({ line, code, problem, severity, detail }) => ({
              mark: severity === 'error' ? ('stopped' as const) : ('attention' as const),
              said: partsAdminWords.severity[severity],
              where: where(line),
              what: code ?? partsAdminWords.wholeList,
              sentence: PROBLEMS[problem] ?? problem,
              detail,
            }))}
          />
        </Sheet>
      ) : null}
    </>
  )
}

type Row = {
  mark: 'stopped' | 'attention'
  said: string
  where: string
  what: string
  sentence: string
  detail: string
}

function Lines({ rows }: { rows: readonly Row[] }) {
  return (
    <>
      <ul className="flex flex-col gap-2">
        {rows.slice(0, MOST_SHOWN).map((row, i) => (
          <li key={i} className="flex flex-wrap items-baseline gap-x-3">
            <StateMark kind={row.mark}>{row.said}</StateMark>
            <span className="figures">{row.where}</span>
            <span className="font-semibold">{row.what}</span>
            <span>{row.sentence}</span>
            <span className="figures text-quiet">{row.detail}</span>
          </li>
        ))}
      </ul>
      {rows.length > MOST_SHOWN ? (
        <p className="pt-2 text-quiet">{words.moreOf(MOST_SHOWN, rows.length)}</p>
      ) : null}
    </>
  )
}
