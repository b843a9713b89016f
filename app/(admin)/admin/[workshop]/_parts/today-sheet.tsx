import { Sheet } from '@/components/ui/sheet'
import type { TodayItem } from '@/lib/contracts/today'
import { todayWords as words } from '@/lib/messages/today'
import { todayHref } from '@/lib/services/_steps/today-href'

type Props = { slug: string; locale: string; items: readonly TodayItem[] }

/** What needs the owner today: what it is, what follows if nothing is done, and the one place to do it. */
export function TodaySheet({ slug, locale, items }: Props) {
  return (
    <Sheet id="today" title={words.title} aside={items.length > 0 ? words.count(items.length) : undefined}>
      {items.length === 0 ? (
        <p>{words.none}</p>
      ) : (
        <ol className="border-t border-rule">
          {items.map((item, index) => {
            const { title, detail, action } = words.item(item, locale)
            return (
              <li
                key={index}
                className="grid gap-x-6 gap-y-1 border-b border-rule py-3 sm:grid-cols-[minmax(0,1fr)_auto]"
              >
                <div className="min-w-0">
                  <h3 className="text-17">
                    {title}
                    {item.run ? (
                      <span className="font-text text-15 font-normal text-quiet">
                        {' '}
                        · {words.runOf(item.run)}
                      </span>
                    ) : null}
                  </h3>
                  <p className="max-w-words text-15">{detail}</p>
                </div>
                <a href={todayHref(slug, item)} className="inline-flex min-h-11 items-center text-15">
                  {action} <span className="sr-only">{item.run ? words.runOf(item.run) : title}</span>
                </a>
              </li>
            )
          })}
        </ol>
      )}
    </Sheet>
  )
}
