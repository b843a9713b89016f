import { ui } from '@/lib/messages/ui'

type Props = { label: string; done: number; total: number; failed?: number }

/** How far a long piece of work is: n of m, with a line that fills. */
export function Progress({ label, done, total, failed = 0 }: Props) {
  const share = total > 0 ? Math.min(100, (done / total) * 100) : 0
  const wrong = total > 0 ? Math.min(share, (failed / total) * 100) : 0
  return (
    <div>
      <div className="text-15 flex flex-wrap items-baseline justify-between gap-x-4">
        <span>{label}</span>
        <span className="figures">{ui.progress(done, total)}</span>
      </div>
      <div
        role="progressbar"
        aria-label={label}
        aria-valuemin={0}
        aria-valuemax={total}
        aria-valuenow={done}
        aria-valuetext={ui.progress(done, total)}
      >
        <svg
          viewBox="0 0 100 10"
          preserveAspectRatio="none"
          className="block h-2.5 w-full"
          aria-hidden="true"
        >
          <rect x="0" y="0" width={share} height="10" className="fill-tide" />
          <rect x={share - wrong} y="0" width={wrong} height="10" className="fill-rust" />
          <path d="M0 9.5H100" className="stroke-quiet" strokeWidth="1" vectorEffect="non-scaling-stroke" />
        </svg>
      </div>
      {failed > 0 ? <p className="text-15 text-rust font-semibold">{ui.failed(failed)}</p> : null}
    </div>
  )
}
