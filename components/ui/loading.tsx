import { ui } from '@/lib/messages/ui'

/** Ruled lines where content will stand. */
export function Loading({ lines = 4, what }: { lines?: number; what?: string }) {
  return (
    <div role="status" className="py-3">
      <p className="text-15 text-quiet">{what ?? ui.loading}</p>
      <div aria-hidden="true" className="pt-2">
        {Array.from({ length: lines }, (_, line) => (
          <div key={line} className="border-rule h-8 border-b" />
        ))}
      </div>
    </div>
  )
}
