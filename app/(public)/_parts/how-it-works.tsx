import { Sheet } from '@/components/ui/sheet'
import { publicWords as words } from '@/lib/messages/public'

/** The job in four steps, for someone who has never been here. */
export function HowItWorks() {
  return (
    <Sheet title={words.howTitle}>
      <ol className="border-t border-rule">
        {words.how.map(([title, detail], index) => (
          <li key={title} className="grid grid-cols-[2rem_minmax(0,1fr)] border-b border-rule py-2.5">
            <span className="figures text-quiet" aria-hidden="true">
              {index + 1}
            </span>
            <div className="max-w-words">
              <h3 className="text-17">{title}</h3>
              <p className="text-15 text-quiet">{detail}</p>
            </div>
          </li>
        ))}
      </ol>
    </Sheet>
  )
}
