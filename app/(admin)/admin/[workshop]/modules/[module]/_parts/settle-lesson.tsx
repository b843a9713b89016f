import { Button } from '@/components/ui/button'
import { Disclosure } from '@/components/ui/disclosure'
import { Form } from '@/components/ui/form'
import { SelectField } from '@/components/ui/select-field'
import { TextField } from '@/components/ui/text-field'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

type Props = { slug: string; module: string; lesson: string; later: readonly string[] }

/** The two ways a lesson ends: a later revision mends it, or it is lived with for a reason. */
export function SettleLesson({ slug, module, lesson, later }: Props) {
  return (
    <Disclosure summary={words.settle}>
      <div className="grid gap-6 sm:grid-cols-2">
        {later.length > 0 ? (
          <Form
            action={paths.api.adminModulePart(slug, module, 'lessons/mend')}
            hidden={{ lesson }}
            foot={<Button kind="secondary">{words.mend}</Button>}
          >
            <SelectField
              name="revision"
              id={`mend-${lesson}`}
              label={words.revision}
              options={later.map((letter) => ({ value: letter, label: letter }))}
              empty={false}
              defaultValue={later[0]}
              width="short"
            />
          </Form>
        ) : null}
        <Form
          action={paths.api.adminModulePart(slug, module, 'lessons/waive')}
          hidden={{ lesson }}
          foot={<Button kind="secondary">{words.waive}</Button>}
        >
          <TextField name="reason" id={`waive-${lesson}`} label={words.waiveReason} width="full" />
        </Form>
      </div>
    </Disclosure>
  )
}
