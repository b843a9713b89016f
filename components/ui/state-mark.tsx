import { classNames } from './class-names'

export type MarkKind = 'done' | 'open' | 'attention' | 'stopped'

const colours: Record<MarkKind, string> = {
  done: 'text-kelp',
  open: 'text-quiet',
  attention: 'text-straw',
  stopped: 'text-rust',
}

/** ● ○ ▲ ✕, drawn so that every face shows the same; never without words beside it. */
export function Mark({ kind, className }: { kind: MarkKind; className?: string }) {
  return (
    <svg
      viewBox="0 0 12 12"
      aria-hidden="true"
      focusable="false"
      className={classNames('inline-block h-[0.7em] w-[0.7em] shrink-0', className)}
    >
      {kind === 'done' ? <circle cx="6" cy="6" r="5.5" fill="currentColor" /> : null}
      {kind === 'open' ? (
        <circle cx="6" cy="6" r="4.75" fill="none" stroke="currentColor" strokeWidth="1.5" />
      ) : null}
      {kind === 'attention' ? <path d="M6 0.5 11.75 11.5H0.25Z" fill="currentColor" /> : null}
      {kind === 'stopped' ? (
        <path d="M1.5 1.5 10.5 10.5M10.5 1.5 1.5 10.5" stroke="currentColor" strokeWidth="2.25" />
      ) : null}
    </svg>
  )
}

/** A state: a mark and its word. The colour only repeats what both say. */
export function StateMark({ kind, children }: { kind: MarkKind; children: React.ReactNode }) {
  return (
    <span className={classNames('inline-flex items-baseline gap-1.5 font-semibold', colours[kind])}>
      <Mark kind={kind} />
      <span>{children}</span>
    </span>
  )
}
