import { classNames } from './class-names'
import { Mark, type MarkKind } from './state-mark'

type Kind = 'plain' | 'done' | 'attention' | 'stopped'
type Props = {
  kind?: Kind
  /** Stands on the line, and says in a word or two what this is. */
  title: React.ReactNode
  /** Read out when it appears: after something was done. */
  live?: boolean
  children: React.ReactNode
}

const lines: Record<Kind, string> = {
  plain: '',
  done: 'line-kelp',
  attention: 'line-straw',
  stopped: 'line-rust',
}
const colours: Record<Kind, string> = {
  plain: '',
  done: 'text-kelp',
  attention: 'text-straw',
  stopped: 'text-rust',
}

/** Something to read before going on, in a frame whose title sits on its line. */
export function Notice({ kind = 'plain', title, live, children }: Props) {
  return (
    <div role={live ? 'status' : 'note'} className={classNames('below-line', lines[kind])}>
      <div className="on-line">
        <p className={classNames('text-13 flex items-baseline gap-1.5 font-semibold', colours[kind])}>
          {kind === 'plain' ? null : <Mark kind={kind satisfies MarkKind} />}
          {title}
        </p>
      </div>
      <div className="max-w-words px-3 pt-1 pb-3">{children}</div>
    </div>
  )
}
