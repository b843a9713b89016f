import type { Metadata } from 'next'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { keptForm } from '@/components/forms/kept-form'
import { Button } from '@/components/ui/button'
import { Form } from '@/components/ui/form'
import { PageHead } from '@/components/ui/page-head'
import { NumberField, TextField } from '@/components/ui/text-field'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'

export const metadata: Metadata = { title: words.begin }

type Props = { params: Promise<{ workshop: string }>; searchParams: Promise<{ draft?: string }> }

export default async function NewModulePage({ params, searchParams }: Props) {
  const { workshop: slug } = await params
  await deskOf(slug, 'module:create', paths.adminModuleNew(slug))
  const form = keptForm(await getFormDraft((await searchParams).draft, 'module-new'))
  return (
    <>
      <PageHead
        title={words.begin}
        lead={words.lead}
        trail={[{ href: paths.adminModules(slug), label: words.title }]}
      />
      <Form
        action={paths.api.adminModules(slug)}
        contract="moduleNew"
        form={form}
        foot={<Button>{words.begin}</Button>}
      >
        <TextField name="name" label={words.name} form={form} />
        <TextField name="slug" label={words.slug} hint={words.slugHint} form={form} autoCapitalize="none" />
        <TextField name="oneLine" label={words.oneLine} hint={words.oneLineHint} form={form} width="full" />
        <NumberField name="widthHp" label={words.widthHp} unit={words.hp} form={form} />
        <NumberField name="depthMm" label={words.depthMm} unit={words.millimetres} form={form} />
      </Form>
    </>
  )
}
