import { notFound } from 'next/navigation'
import { deskOf } from '@/app/(admin)/_parts/desk-of'
import { paths } from '@/lib/paths'
import { getModuleDesk } from '@/lib/queries/modules-admin/get-module-desk'

export type ModulePageProps<Q = unknown> = {
  params: Promise<{ workshop: string; module: string }>
  searchParams: Promise<{ draft?: string; saved?: string } & Q>
}

/** The workshop and module of a page, for those who may change it. */
export async function loadModule(params: ModulePageProps['params']) {
  const { workshop: slug, module } = await params
  const { actor, workshop } = await deskOf(slug, 'module:write', paths.adminModule(slug, module))
  const desk = await getModuleDesk({ actor, workshopId: workshop.id, module })
  if (!desk) notFound()
  return { actor, workshop, desk }
}
