import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import type { FormState } from '@/components/ui/form-state'
import type { PlanDesk } from '@/lib/contracts/module-desk'
import { planAdminWords as words } from '@/lib/messages/plan-admin'
import { paths } from '@/lib/paths'
import { PlanBuying } from './plan-buying'
import { PlanSchedule } from './plan-schedule'
import { PlanSelling } from './plan-selling'
import { PlanWork } from './plan-work'

type Props = { slug: string; module: string; plan: PlanDesk; form: FormState }

/** The short cost plan and its schedule, in four sheets. */
export function PlanForm({ slug, module, plan, form }: Props) {
  const { currency } = plan
  return (
    <Form
      action={paths.api.adminModulePart(slug, module, 'plan')}
      contract="plan"
      form={form}
      hidden={{ currency }}
      foot={<Button>{words.save}</Button>}
    >
      <PlanWork offers={plan.offers} currency={currency} form={form} />
      <PlanBuying currency={currency} form={form} />
      <PlanSelling currency={currency} form={form} />
      <PlanSchedule form={form} />
    </Form>
  )
}
