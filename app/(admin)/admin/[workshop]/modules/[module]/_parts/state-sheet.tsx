import { Button, ButtonRow, LinkButton } from '@/components/ui/button'
import { DeedForm } from '@/components/ui/form'
import { Notice } from '@/components/ui/notice'
import type { ModuleDesk } from '@/lib/contracts/module-desk'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { paths } from '@/lib/paths'

const KINDS = { draft: 'plain', published: 'done', archived: 'attention' } as const

/** Where a module stands and the one step on from there. */
export function StateSheet({ slug, module }: { slug: string; module: ModuleDesk['module'] }) {
  const { state } = module
  return (
    <Notice kind={KINDS[state]} title={words[`${state}Title`]}>
      <p className="pb-3">{words[state]}</p>
      <ButtonRow>
        {state === 'published' ? (
          <LinkButton href={paths.module(slug, module.slug)}>{words.publicPage}</LinkButton>
        ) : (
          <DeedForm action={paths.api.adminModulePart(slug, module.slug, 'publish')}>
            <Button>{state === 'draft' ? words.publish : words.publishAgain}</Button>
          </DeedForm>
        )}
        {state === 'published' ? null : (
          <LinkButton href={paths.adminModulePage(slug, module.slug, 'preview')}>{words.preview}</LinkButton>
        )}
        {state === 'published' ? (
          <DeedForm action={paths.api.adminModulePart(slug, module.slug, 'archive')}>
            <Button kind="secondary">{words.archive}</Button>
          </DeedForm>
        ) : null}
      </ButtonRow>
    </Notice>
  )
}
