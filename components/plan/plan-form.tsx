import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import type { OfferKind } from '@/lib/contracts/fields'
import { planAdminWords as words } from '@/lib/messages/plan-admin'
import { PlanBuying } from './plan-buying'
import { PlanOutlook } from './plan-outlook'
import { PlanSchedule } from './plan-schedule'
import { PlanSelling } from './plan-selling'
import { PlanWork } from './plan-work'

type Props = { action: string; currency: string; offers: readonly OfferKind[]; form: FormState }

/** The short cost plan and its schedule, in five sheets; of a module or of one run. */
export function PlanForm({ action, currency, offers, form }: Props) {
  return (
    <Form
      action={action}
      contract="plan"
      form={form}
      hidden={{ currency }}
      foot={<Button>{words.save}</Button>}
    >
      <PlanWork offers={offers} currency={currency} form={form} />
      <PlanBuying currency={currency} form={form} />
      <PlanSelling currency={currency} form={form} />
      <PlanOutlook currency={currency} form={form} />
      <PlanSchedule form={form} />
    </Form>
  )
}
