import { Notice } from '@/components/ui/notice'
import type { RunPage } from '@/lib/contracts/run-page'
import { runWords as words } from '@/lib/messages/runs'

/** What buyers were told besides the figures: why below the minimum, why called off. */
export function RunNotes({ page }: { page: RunPage }) {
  const { lockReason, callOffReason } = page
  return (
    <>
      {lockReason === null ? null : (
        <div className="pb-6">
          <Notice kind="plain" title={words.lockedBelow}>
            <p className="whitespace-pre-line">{lockReason}</p>
          </Notice>
        </div>
      )}
      {callOffReason === null ? null : (
        <div className="pb-6">
          <Notice kind="stopped" title={words.calledOffBecause}>
            <p className="whitespace-pre-line">{callOffReason}</p>
          </Notice>
        </div>
      )}
    </>
  )
}
