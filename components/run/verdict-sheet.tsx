import { Facts } from '@/components/ui/facts'
import { Notice } from '@/components/ui/notice'
import { decision } from '@/lib/messages/decision'

type Props = Parameters<typeof decision.verdict>[0]

/** The verdict over a run in words, with the three figures that carry it. */
export function VerdictSheet(facts: Props) {
  const { kind, title, words } = decision.verdict(facts)
  const figures = decision.figures(facts)
  return (
    <div className="flex flex-col gap-3">
      <Notice kind={kind} title={title}>
        <p>{words}</p>
        {facts.state === 'draft' || facts.state === 'called_off' ? null : <p>{decision.carried(facts)}</p>}
      </Notice>
      <Facts facts={figures.map(({ name, value }) => ({ name, value, kind: 'figures' as const }))} />
      <p className="max-w-words text-13 text-quiet">{decision.profitNote}</p>
    </div>
  )
}
