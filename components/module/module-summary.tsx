import { FillGauge } from '@/components/charts/fill-gauge'
import { DayText } from '@/components/format/day-text'
import { When } from '@/components/format/when'
import { ButtonRow, LinkButton } from '@/components/ui/button'
import { Facts } from '@/components/ui/facts'
import { Notice } from '@/components/ui/notice'
import { Sheet } from '@/components/ui/sheet'
import type { ModulePage, PageRun } from '@/lib/contracts/module-page'
import { formatMoney } from '@/lib/core/money/format'
import { offerNames } from '@/lib/messages/mails/words'
import { publicWords as words } from '@/lib/messages/public'
import { LOCALE } from '@/lib/messages/ui'
import { writtenNumber } from '@/lib/messages/written'
import { paths } from '@/lib/paths'

/** Price, whether it is happening, by when, and the way in: what a phone shows first. */
export function ModuleSummary({ page }: { page: ModulePage }) {
  const { run, workshop } = page
  return (
    <Sheet title={words.happeningTitle} id="happening">
      <div className="flex flex-col gap-4">
        <p className="text-21">{priceWords(page)}</p>
        {run ? <RunNow run={run} zone={workshop.timeZone} /> : <p>{words.noRun}</p>}
        <p>{interestWords(page)}</p>
        {workshop.isOpen ? (
          <WaysIn page={page} />
        ) : (
          <Notice kind="attention" title={words.suspendedTitle}>
            {words.suspended}
          </Notice>
        )}
      </div>
    </Sheet>
  )
}

function priceWords({ offers, workshop }: ModulePage): string {
  const prices = offers.flatMap(({ priceMinor }) => priceMinor ?? [])
  if (prices.length === 0) return words.priceOpen
  return words.priceFrom(formatMoney(Math.min(...prices), workshop.currency, LOCALE))
}

function interestWords({ interest }: ModulePage): string {
  return interest ? words.interest(interest.confirmed, interest.units) : words.interestHidden
}

function WaysIn({ page: { run, workshop, module } }: { page: ModulePage }) {
  const deposits = (run?.offers ?? []).map(({ depositMinor }) => depositMinor)
  if (!run?.takesOrders || deposits.length === 0)
    return (
      <ButtonRow>
        <LinkButton kind="primary" href="#interest">
          {words.register}
        </LinkButton>
      </ButtonRow>
    )
  const least = formatMoney(Math.min(...deposits), workshop.currency, LOCALE)
  return (
    <ButtonRow>
      <LinkButton kind="primary" href={paths.orderForm(workshop.slug, module.slug)}>
        {run.isFull ? words.joinWaiting : words.orderFrom(least)}
      </LinkButton>
      <LinkButton kind="plain" href="#interest">
        {words.registerToo}
      </LinkButton>
    </ButtonRow>
  )
}

function RunNow({ run, zone }: { run: PageRun; zone: string }) {
  const isTaking = run.state === 'taking_deposits'
  const { deposited, minimum, maximum, daysLeft, decideBy } = run
  return (
    <>
      <FillGauge
        deposited={deposited}
        minimum={minimum}
        maximum={maximum}
        {...(isTaking && { daysLeft, decideBy })}
      />
      {isTaking ? null : <p>{words.locked(deposited)}</p>}
      {isTaking && daysLeft < 0 ? <p>{words.lastDayPassed}</p> : null}
      {run.silentDays === null ? null : (
        <Notice kind="attention" title={words.silent(run.silentDays)}>
          {words.silentWords}
        </Notice>
      )}
      <Facts facts={factsOf(run, zone)} />
      {isTaking && !run.isOpenToAll ? <p className="text-15 text-quiet">{words.headStart}</p> : null}
    </>
  )
}

function factsOf(run: PageRun, zone: string) {
  const isTaking = run.state === 'taking_deposits'
  const fact = (name: string, value: React.ReactNode) => ({ name, value })
  return [
    ...(isTaking ? [fact(words.decideBy, <DayText day={run.decideBy} weekday />)] : []),
    ...(run.lockedOn ? [fact(words.lockedOn, <DayText day={run.lockedOn} />)] : []),
    ...(isTaking && !run.isOpenToAll && run.opensToAllAt
      ? [fact(words.opensToAll, <When at={run.opensToAllAt} zone={zone} />)]
      : []),
    ...promisesOf(run).map(([name, day]) => fact(name, <DayText day={day} />)),
    ...(run.held > 0 ? [fact(words.held, writtenNumber(run.held))] : []),
    ...(run.waiting > 0 ? [fact(words.waiting, writtenNumber(run.waiting))] : []),
    fact(words.revision, run.revision),
    ...(isTaking ? [fact(words.limit, writtenNumber(run.limitPerPerson))] : []),
  ]
}

/** One line where every form is promised for the same day. */
function promisesOf({ offers }: PageRun): [name: string, day: string][] {
  const days = new Set(offers.map(({ postedBy }) => postedBy))
  const [only] = days
  if (days.size === 1 && only !== undefined) return [[words.postedBy, only]]
  return offers.map(({ offer, postedBy }) => [words.postedByOffer(offerNames[offer]), postedBy])
}
