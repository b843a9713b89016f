'use client'
import { useRef, useState } from 'react'
import { SelectField } from '@/components/ui/select-field'
import type { ModulePublic } from '@/lib/contracts/modules'
import { deliveryWords as words } from '@/lib/messages/delivery'
import { paths } from '@/lib/paths'
import type { TaxFacts } from './delivery-table'

type Props = {
  workshop: string
  module: string
  home: string
  countries: readonly { value: string; label: string }[]
  tax: TaxFacts
  /** The prices for the workshop's own country, as the server wrote them. */
  children: React.ReactNode
}

/** Prices for another country: asked of the server and drawn only once somebody chooses one. */
export function CountryPrices({ workshop, module, home, countries, tax, children }: Props) {
  const [table, setTable] = useState<React.ReactNode>(null)
  const [failure, setFailure] = useState('')
  const asked = useRef(home)

  async function show(country: string) {
    asked.current = country
    setFailure('')
    if (country === home) return setTable(null)
    try {
      const [answer, { DeliveryTable }] = await Promise.all([
        fetch(`${paths.api.module(workshop, module)}?country=${country}`),
        import('./delivery-table'),
      ])
      if (!answer.ok) throw new Error(`status ${answer.status}`)
      const { delivery } = (await answer.json()) as ModulePublic
      if (asked.current === country) setTable(<DeliveryTable delivery={delivery} tax={tax} />)
    } catch {
      if (asked.current === country) setFailure(words.countryFailed)
    }
  }

  return (
    <div className="flex flex-col gap-4">
      <div className="noscript:hidden">
        <SelectField
          name="deliverTo"
          label={words.country}
          hint={words.countryHint}
          options={countries}
          empty={false}
          defaultValue={home}
          error={failure || undefined}
          autoComplete="off"
          onChange={(event) => void show(event.target.value)}
        />
      </div>
      <div aria-live="polite">{table ?? children}</div>
      <noscript>
        <p className="text-15 text-quiet">{words.countryNoScript}</p>
      </noscript>
    </div>
  )
}
