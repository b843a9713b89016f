import { DayText } from '@/components/format/day-text'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'
import type { PartDesk } from '@/lib/contracts/part-forms'
import { partWords as words } from '@/lib/messages/parts'
import { partsAdminWords } from '@/lib/messages/parts-admin'
import { writtenNumber } from '@/lib/messages/written'

/** What is known of a part beside its prices. */
export function PartFacts({ part }: { part: PartDesk }) {
  const { sample, usedIn } = part
  return (
    <Sheet title={words.facts} id="facts">
      <Facts
        facts={[
          { name: words.lifecycle, value: words.lifecycles[part.lifecycle] },
          { name: words.onHand, value: writtenNumber(part.onHand) },
          {
            name: words.usedIn,
            value:
              usedIn.map(({ letter, perUnit }) => words.use(letter, perUnit)).join(', ') || words.nowhere,
          },
          {
            name: partsAdminWords.sample,
            value: (
              <>
                {partsAdminWords.samples[sample.state]}
                {sample.on === null ? null : (
                  <>
                    , <DayText day={sample.on} />
                  </>
                )}
                {sample.note ? `: ${sample.note}` : ''}
              </>
            ),
          },
        ]}
      />
    </Sheet>
  )
}
