import { formatMoney } from '@/lib/core/money/format'
import { LOCALE } from '@/lib/messages/ui'
import { Figure } from './figure'

/** A sum in its currency; the sign and symbol stand lighter than the digits. */
export function Money({
  minor,
  currency,
  locale = LOCALE,
}: {
  minor: number
  currency: string
  locale?: string
}) {
  return <Figure text={formatMoney(minor, currency, locale)} />
}
