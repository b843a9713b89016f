import { AddressFields } from '@/components/order/address-fields'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import { Sheet } from '@/components/ui/sheet'
import type { OrderFormView } from '@/lib/contracts/order-quote'
import { orderFormWords as words } from '@/lib/messages/orders'
import { paths } from '@/lib/paths'
import { OfferRow } from '@/components/order/offer-row'

/** What is wanted and where it goes; every sum is shown on the next page. */
export function OrderForm({ run, form }: { run: OrderFormView; form?: FormState }) {
  const where = { workshop: run.workshop.slug, module: run.module.slug }
  return (
    <Form
      action={paths.api.orderDraft}
      form={form}
      hidden={{ run: run.run, ...where }}
      foot={<Button>{words.next}</Button>}
    >
      <Sheet title={words.what} id="f-lines">
        <p className="max-w-words pb-4 text-15 text-quiet">
          {words.places(run.free)} {words.limit(run.limitPerPerson)}
        </p>
        <div className="flex flex-col gap-6">
          {run.offers.map((offer, index) => (
            <OfferRow key={offer.offer} run={run} offer={offer} index={index} form={form} />
          ))}
        </div>
      </Sheet>
      <Sheet title={words.where} id="address">
        <div className="flex flex-col gap-5">
          <AddressFields prefix="address." form={form} countries={run.countries} />
        </div>
      </Sheet>
    </Form>
  )
}
