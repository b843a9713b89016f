import { Count } from '@/components/format/count'
import { DayText } from '@/components/format/day-text'
import { Interval } from '@/components/format/interval'
import { Money } from '@/components/format/money'
import { Percent } from '@/components/format/percent'
import { Weight } from '@/components/format/weight'
import { When } from '@/components/format/when'
import { Facts } from '@/components/ui/facts'
import { Sheet } from '@/components/ui/sheet'

export function Figures() {
  return (
    <Sheet id="figures" title="Figures and type">
      <div className="grid gap-8 md:grid-cols-2">
        <div>
          <p className="font-heading text-40 font-semibold">40 Fills to the brim</p>
          <p className="font-heading text-28 font-semibold">28 Fills to the brim</p>
          <p className="font-heading text-21 font-semibold">21 Fills to the brim</p>
          <p className="text-17">17 Deposits are paid back in full until the decision.</p>
          <p className="text-15">15 Deposits are paid back in full until the decision.</p>
          <p className="text-13">13 Deposits are paid back in full until the decision.</p>
          <p className="figures text-13">13 RB123456785IE 0O 1lI 5S 8B Łódź Ångström</p>
        </div>
        <Facts
          facts={[
            { name: 'Money', value: <Money minor={1890050} currency="EUR" />, kind: 'figures' },
            { name: 'Loss', value: <Money minor={-42000} currency="EUR" />, kind: 'figures' },
            { name: 'Yen', value: <Money minor={16500} currency="JPY" locale="ja-JP" />, kind: 'figures' },
            {
              name: 'Interval',
              value: <Interval value={66} low={57} high={76} unit="units" />,
              kind: 'figures',
            },
            { name: 'Weight', value: <Weight grams={1250} />, kind: 'figures' },
            { name: 'Percent', value: <Percent basisPoints={2300} />, kind: 'figures' },
            { name: 'Nearly sure', value: <Percent ratio={0.9991} />, kind: 'figures' },
            { name: 'Count', value: <Count value={1200} forms={{ one: '# order', other: '# orders' }} /> },
            { name: 'When', value: <When at="2027-03-03T13:05:00Z" zone="Europe/Berlin" /> },
            { name: 'Day', value: <DayText day="2027-03-03" weekday /> },
          ]}
        />
      </div>
    </Sheet>
  )
}
