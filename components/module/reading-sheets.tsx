import { DayText } from '@/components/format/day-text'
import { Disclosure } from '@/components/ui/disclosure'
import { Facts } from '@/components/ui/facts'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { ModulePage } from '@/lib/contracts/module-page'
import { offerNames } from '@/lib/messages/mails/words'
import { publicWords as words } from '@/lib/messages/public'

/** What must be known before building or using it: of the module, then of each form. */
export function CautionsSheet({ page: { module, offers } }: { page: ModulePage }) {
  const ages = [...new Set(offers.map(({ ageFrom }) => ageFrom))].filter((age) => age > 0)
  return (
    <Sheet title={words.cautionsTitle} id="cautions">
      <div className="flex flex-col gap-3">
        {module.cautions ? <PlainText text={module.cautions} /> : null}
        {cautionsOf(offers, module.cautions).map(([cautions, names]) => (
          <div key={names}>
            <h3 className="text-17">{words.cautionsOffer(names)}</h3>
            <PlainText text={cautions} />
          </div>
        ))}
        {ages.length > 0 ? <p>{words.age(Math.max(...ages))}</p> : null}
        <p className="max-w-words text-15 text-quiet">{words.cautionsLocal}</p>
      </div>
    </Sheet>
  )
}

/** Forms that are cautioned alike share a paragraph; what the module says already is not said again. */
function cautionsOf(offers: ModulePage['offers'], said: string): [cautions: string, names: string][] {
  const texts = [...new Set(offers.map(({ cautions }) => cautions))].filter(
    (text) => text !== '' && text !== said,
  )
  return texts.map((text) => {
    const same = offers.filter(({ cautions }) => cautions === text)
    return [text, same.map(({ offer }) => offerNames[offer]).join(', ')]
  })
}

/** The workshop's terms in full: those a run was opened under, else the newest. */
export function TermsSheet({ terms }: { terms: ModulePage['terms'] }) {
  return (
    <Sheet title={words.termsTitle} id="terms">
      {terms ? (
        <>
          <p className="text-15 text-quiet">{words.termsOf(terms.number, terms.publishedOn)}</p>
          <Disclosure summary={words.termsRead}>
            <PlainText text={terms.body} />
          </Disclosure>
        </>
      ) : (
        <p>{words.noTerms}</p>
      )}
    </Sheet>
  )
}

/** Size, power and the maker's own lines. */
export function SpecificationSheet({ page: { module, run, workshop } }: { page: ModulePage }) {
  const rails = [
    [words.rail.plus12, module.plus12Ma],
    [words.rail.minus12, module.minus12Ma],
    [words.rail.plus5, module.plus5Ma],
  ] as const
  const figure = (name: string, value: string) => ({ name, value, kind: 'figures' as const })
  return (
    <Sheet
      title={words.specificationTitle}
      id="specification"
      titleBlock={{
        what: words.sheetWhat(module.name),
        who: workshop.name,
        ...(run && { revision: run.revision }),
        ...(run?.lockedOn && { when: <DayText day={run.lockedOn} /> }),
      }}
    >
      <Facts
        facts={[
          figure(words.width, words.widthHp(module.widthHp)),
          figure(words.depth, words.depthMm(module.depthMm)),
          ...rails
            .filter(([, value]) => value > 0)
            .map(([name, value]) => figure(name, words.milliamperes(value))),
          ...module.specification.map(({ name, value }) => ({ name, value })),
        ]}
      />
    </Sheet>
  )
}
