import { FillGauge } from '@/components/charts/fill-gauge'
import { FrontPanelDrawing } from '@/components/charts/front-panel-drawing'
import type { ModuleCard as Card } from '@/lib/contracts/module-page'
import { publicWords as words } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

type Props = { cards: readonly Card[]; showWorkshop?: boolean }

/** Modules one under the other: the front panel, the name, one line, and how full the run is. */
export function ModuleCards({ cards, showWorkshop = false }: Props) {
  return (
    <ul className="border-t border-rule">
      {cards.map((card) => (
        <li
          key={`${card.workshop.slug}/${card.slug}`}
          className="flex flex-wrap items-start gap-x-6 gap-y-3 border-b border-rule py-4"
        >
          <div className="max-w-full overflow-hidden">
            <FrontPanelDrawing
              name={card.name}
              widthHp={card.widthHp}
              controls={card.controls}
              size="plain"
            />
          </div>
          <div className="min-w-0 grow basis-64">
            <h3 className="text-21">
              <a href={paths.module(card.workshop.slug, card.slug)}>{card.name}</a>
            </h3>
            {showWorkshop ? <p className="text-13 text-quiet">{words.by(card.workshop.name)}</p> : null}
            <p className="max-w-words pb-2">{card.oneLine}</p>
            <Happening run={card.run} />
          </div>
        </li>
      ))}
    </ul>
  )
}

function Happening({ run }: { run: Card['run'] }) {
  if (run === null) return <p className="text-15">{words.gathering}</p>
  if (run.state === 'locked') return <p className="text-15">{words.beingMade(run.deposited)}</p>
  return <FillGauge size="small" {...run} />
}
