import { Facts } from '@/components/ui/facts'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { Maker, PublicRecord } from '@/lib/contracts/module-page'
import { publicWords as words } from '@/lib/messages/public'
import { paths } from '@/lib/paths'

type Props = { maker: Maker; record: PublicRecord; isOwnPage?: boolean }

/** Who sells, where they can be written to, and how their earlier runs went. */
export function MakerSheet({ maker, record, isOwnPage = false }: Props) {
  const hasRecord = record.daysLate.length + record.repaidInDays.length > 0
  return (
    <Sheet title={words.makerTitle} id="maker">
      <div className="flex flex-col gap-4">
        {maker.about ? <PlainText text={maker.about} /> : null}
        <Facts facts={factsOf(maker)} />
        <div>
          <h3 className="text-17">{words.recordTitle}</h3>
          <p className="max-w-words">{hasRecord ? words.record(record) : words.noRecord}</p>
        </div>
        {isOwnPage ? null : (
          <p>
            <a href={paths.workshop(maker.slug)} className="inline-flex min-h-6 items-center">
              {words.aboutMaker(maker.name)}
            </a>
          </p>
        )}
      </div>
    </Sheet>
  )
}

function factsOf({ name, legalName, address, replyTo, phone, taxNumber }: Maker) {
  return [
    { name: words.trader, value: legalName && legalName !== name ? `${name}, ${legalName}` : name },
    ...(address.length > 0
      ? [{ name: words.address, value: <address className="not-italic">{linesOf(address)}</address> }]
      : []),
    ...(replyTo ? [{ name: words.email, value: <a href={`mailto:${replyTo}`}>{replyTo}</a> }] : []),
    ...(phone ? [{ name: words.phone, value: phone }] : []),
    ...(taxNumber ? [{ name: words.taxNumber, value: taxNumber }] : []),
  ]
}

const linesOf = (lines: readonly string[]) =>
  lines.map((line) => (
    <span key={line} className="block">
      {line}
    </span>
  ))
