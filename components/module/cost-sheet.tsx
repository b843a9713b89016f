import { Disclosure } from '@/components/ui/disclosure'
import { PlainText } from '@/components/ui/plain-text'
import { Sheet } from '@/components/ui/sheet'
import type { ModulePage, PageOffer } from '@/lib/contracts/module-page'
import { countryName, isCountry } from '@/lib/core/data/country'
import { formatMoney } from '@/lib/core/money/format'
import { offerWords, publicWords as words } from '@/lib/messages/public'
import { LOCALE } from '@/lib/messages/ui'
import { CountryPrices } from './country-prices'
import { DeliveryTable } from './delivery-table'

/** What it costs in each form, with postage and tax for the country chosen, and what is in each. */
export function CostSheet({ page }: { page: ModulePage }) {
  const { workshop, module, offers, delivery, countries } = page
  const tax = { pricesIncludeTax: workshop.pricesIncludeTax, taxNote: workshop.taxNote }
  const options = [...new Set([workshop.country, ...countries])]
    .filter(isCountry)
    .map((value) => ({ value, label: countryName(value) }))
    .sort((a, b) => a.label.localeCompare(b.label, LOCALE))
  const table = <DeliveryTable delivery={delivery} tax={tax} />
  return (
    <Sheet title={words.costTitle} id="cost">
      {options.length > 1 ? (
        <CountryPrices
          workshop={workshop.slug}
          module={module.slug}
          home={workshop.country}
          countries={options}
          tax={tax}
        >
          {table}
        </CountryPrices>
      ) : (
        table
      )}
      <div className="pt-3">
        {offers.filter(hasDetails).map((offer) => (
          <OfferDetails key={offer.offer} offer={offer} currency={workshop.currency} />
        ))}
      </div>
    </Sheet>
  )
}

const hasDetails = ({ contents, choices }: PageOffer) => contents !== '' || choices.length > 0

function OfferDetails({ offer, currency }: { offer: PageOffer; currency: string }) {
  const answer = ({ label, surchargeMinor }: PageOffer['choices'][number]['answers'][number]) =>
    surchargeMinor > 0 ? words.surcharge(label, formatMoney(surchargeMinor, currency, LOCALE)) : label
  return (
    <Disclosure summary={words.contents(offerWords[offer.offer])}>
      {offer.contents ? <PlainText text={offer.contents} /> : null}
      {offer.choices.length > 0 ? (
        <>
          <h3 className="pt-2 text-15">{words.choices}</h3>
          <ul className="ml-5 list-disc">
            {offer.choices.map(({ question, answers }) => (
              <li key={question}>
                {question}: {answers.map(answer).join(', ')}
              </li>
            ))}
          </ul>
        </>
      ) : null}
    </Disclosure>
  )
}
