import { Mark, type MarkKind } from './state-mark'

type Happening = {
  key: string
  when: React.ReactNode
  words: React.ReactNode
  detail?: React.ReactNode
  mark?: MarkKind
}

const colours: Record<MarkKind, string> = {
  done: 'text-kelp',
  open: 'text-quiet',
  attention: 'text-straw',
  stopped: 'text-rust',
}

/** What happened, one line after the other along a rule. */
export function StoryList({ happenings }: { happenings: readonly Happening[] }) {
  return (
    <ol className="border-rule ml-1.5 border-l">
      {happenings.map(({ key, when, words, detail, mark = 'open' }) => (
        <li key={key} className="relative pb-4 pl-5 last:pb-0">
          <span className={`bg-sheet text-17 absolute top-1 -left-[0.4rem] leading-none ${colours[mark]}`}>
            <Mark kind={mark} />
          </span>
          <p className="text-13 text-quiet">{when}</p>
          <p>{words}</p>
          {detail ? <div className="max-w-words text-15 text-quiet">{detail}</div> : null}
        </li>
      ))}
    </ol>
  )
}
