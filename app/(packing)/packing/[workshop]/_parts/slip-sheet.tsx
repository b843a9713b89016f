import { DayText } from '@/components/format/day-text'
import { AddressLines } from '@/components/parcel/address-lines'
import { CodeBars } from '@/components/parcel/code-bars'
import { TitleBlock } from '@/components/ui/title-block'
import type { PackingSlip } from '@/lib/contracts/papers'
import { SLIP_WORDS } from '@/lib/messages/slip-words'
import { code128 } from '@/lib/papers/code-128'
import type { SlipsPaper } from '@/lib/queries/packing/get-packing-slips'

type Props = { paper: SlipsPaper; slip: PackingSlip; isLast?: boolean }

/** One packing slip as it prints: a sheet of its own. */
export function SlipSheet({ paper, slip, isLast = true }: Props) {
  const words = SLIP_WORDS[slip.language]
  const place = slip.isReplacement ? words.replacement : words.parcel(slip.parcel.nth, slip.parcel.of)
  const isPart = slip.parcel.nth < slip.parcel.of && !slip.isReplacement
  return (
    <section
      aria-label={words.order(slip.orderNumber)}
      className={`border border-rule bg-sheet p-4 print:border-0 print:p-0 ${isLast ? '' : 'break-after-page'}`}
    >
      <div className="flex flex-wrap items-start justify-between gap-4">
        <div>
          <h2 className="text-28">{words.name}</h2>
          <p className="text-21 font-semibold">{words.order(slip.orderNumber)}</p>
          <p>{place}</p>
        </div>
        <CodeBars widths={code128(slip.orderNumber)} text={slip.orderNumber} />
      </div>
      <div className="my-4 grid gap-4 border-t border-ink pt-3 sm:grid-cols-2 print:grid-cols-2">
        <div>
          <p className="text-13 text-quiet">{words.from}</p>
          <AddressLines lines={paper.from} />
        </div>
        <div>
          <p className="text-13 text-quiet">{words.to}</p>
          <AddressLines lines={slip.to} />
          {slip.toOwnScript ? (
            <div className="pt-3">
              <AddressLines lines={slip.toOwnScript} />
            </div>
          ) : null}
        </div>
      </div>
      <table className="w-full text-left">
        <thead>
          <tr className="border-b border-ink text-13">
            <th scope="col" className="w-24 py-1 pr-4 text-right">
              {words.columns.quantity}
            </th>
            <th scope="col" className="py-1">
              {words.columns.thing}
            </th>
          </tr>
        </thead>
        <tbody>
          {slip.lines.map((line, index) => (
            <tr key={index} className="border-b border-rule align-top">
              <td className="figures py-2 pr-4 text-right font-semibold">{line.quantity}</td>
              <td className="py-2">
                {line.module}, {words.offers[line.offer]}
                {[...line.choices, ...(line.serials.length > 0 ? [words.serials(line.serials)] : [])].map(
                  (below) => (
                    <span key={below} className="block text-15">
                      {below}
                    </span>
                  ),
                )}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="py-4 text-15">
        {isPart ? <p>{words.more}</p> : null}
        <p>{words.problem}</p>
        <p className="figures break-all">{slip.problemUrl}</p>
        <p>{words.noInvoice}</p>
      </div>
      <TitleBlock
        what={`${words.name}, ${words.order(slip.orderNumber)}`}
        who={`${paper.workshop}, ${paper.printedBy}`}
        when={<DayText day={paper.printedOn} />}
      />
    </section>
  )
}
