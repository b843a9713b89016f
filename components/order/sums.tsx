import { Money } from '@/components/format/money'
import { Facts } from '@/components/ui/facts'
import { orderWords as words } from '@/lib/messages/order-page'

type Props = {
  currency: string
  totalMinor: number
  postageMinor: number
  taxMinor: number
  depositMinor: number
  balanceMinor: number
  /** Left out where nothing has been paid yet. */
  paidMinor?: number
  refundedMinor?: number
}

/** What an order costs, and when. */
export function Sums({ currency, paidMinor = 0, refundedMinor = 0, ...sums }: Props) {
  const rows: [string, number][] = [
    [words.goods, sums.totalMinor - sums.postageMinor],
    [words.postage, sums.postageMinor],
    [words.total, sums.totalMinor],
    ...(sums.taxMinor > 0 ? [[words.tax, sums.taxMinor] as [string, number]] : []),
    [words.deposit, sums.depositMinor],
    [words.balance, sums.balanceMinor],
    ...(paidMinor > 0 ? [[words.paid, paidMinor] as [string, number]] : []),
    ...(refundedMinor > 0 ? [[words.paidBack, refundedMinor] as [string, number]] : []),
  ]
  return (
    <Facts
      facts={rows.map(([name, minor]) => ({
        key: name,
        name,
        kind: 'figures',
        value: <Money minor={minor} currency={currency} />,
      }))}
    />
  )
}
