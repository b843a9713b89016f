import { keptForm } from '@/components/forms/kept-form'
import { Button, LinkButton } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { Form } from '@/components/ui/form'
import { Sheet } from '@/components/ui/sheet'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'
import { paths } from '@/lib/paths'
import type { KeptForm } from '@/lib/queries/forms/get-form-draft'

type Kept = KeptForm | null
type Props = { page: RunPage; closed: Kept }

/** What the owner can do with the run as it stands; what moves money leads to a page that asks once more. */
export function DeedsSheet({ page, closed }: Props) {
  const { workshop, id, state, minimum, orders } = page
  if (state === 'closed' || state === 'called_off') return null
  const to = (deed: Parameters<typeof paths.adminRunDeed>[2]) => paths.adminRunDeed(workshop.slug, id, deed)
  // What is in the post is not taken back; single orders still can be cancelled.
  const canCallOff = (orders['posted'] ?? 0) === 0
  const canAsk = state === 'locked' && (orders['reserved'] ?? 0) > 0
  return (
    <Sheet title={words.deeds}>
      <div className="flex flex-col items-start gap-3">
        {state === 'draft' ? (
          <LinkButton href={to('open')} kind="primary">
            {words.open}
          </LinkButton>
        ) : null}
        {state === 'taking_deposits' ? (
          <LinkButton href={to('lock')} kind="primary">
            {words.lock}
          </LinkButton>
        ) : null}
        {canAsk ? (
          <LinkButton href={to('ask-balances')} kind="primary">
            {words.ask}
          </LinkButton>
        ) : null}
        {canCallOff ? <LinkButton href={to('call-off')}>{words.callOff}</LinkButton> : null}
        {state === 'taking_deposits' && minimum > 1 ? (
          <LinkButton href={to('lower-minimum')}>{words.lowerMinimum}</LinkButton>
        ) : null}
        {state === 'taking_deposits' && !page.decideByMoved ? (
          <LinkButton href={to('move-decide-by')}>{words.moveDecideBy}</LinkButton>
        ) : null}
        {state === 'locked' ? (
          <CloseRun action={paths.api.adminRunDeed(workshop.slug, id, 'close')} kept={closed} />
        ) : null}
      </div>
    </Sheet>
  )
}

function CloseRun({ action, kept }: { action: string; kept: Kept }) {
  return (
    <Disclosure summary={words.close} open={kept !== null}>
      <Form action={action} form={keptForm(kept)} foot={<Button kind="secondary">{words.close}</Button>}>
        <p className="max-w-words">{words.closeHint}</p>
      </Form>
    </Disclosure>
  )
}
