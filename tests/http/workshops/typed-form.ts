import type { ReactElement } from 'react'
import { renderToStaticMarkup } from 'react-dom/server'
import { SESSION_COOKIE } from '@/lib/auth/cookies'
import { sessionOf } from '@/tests/http/matrix/people'
import { postForm } from '@/tests/http/signups/post-form'
import type { Person } from '@/models'

// The package brings no types of its own.
const { JSDOM } = (await import('jsdom' as string)) as {
  JSDOM: new (html: string) => { window: { document: Document } }
}

type Handler = Parameters<typeof postForm>[0]
type Control = HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement

/** What a browser without script would send for a form as the page shows it, with some fields typed over. */
export function typedForm(page: ReactElement, typed: Record<string, string> = {}): Record<string, string> {
  const { document } = new JSDOM(renderToStaticMarkup(page)).window
  const form = document.querySelector('form')
  if (!form) throw new Error('the page shows no form')
  const controls = [...form.querySelectorAll<Control>('input, select, textarea')]
  const unknown = Object.keys(typed).filter((name) => !controls.some((control) => control.name === name))
  if (unknown.length > 0) throw new Error(`the form has no fields ${unknown.join(', ')}`)
  const sent = controls.filter(
    (control) => !['checkbox', 'radio'].includes(control.type) || (control as HTMLInputElement).checked,
  )
  return { ...Object.fromEntries(sent.map(({ name, value }) => [name, value])), ...typed }
}

/** Posts a form as somebody signed in, as a browser without script does, and says where it leads. */
export async function send(
  handler: Handler,
  person: Person,
  fields: Record<string, string>,
  params: Record<string, string> = {},
): Promise<{ status: number; to: string }> {
  const cookie = `${SESSION_COOKIE}=${await sessionOf(person)}`
  const answer = await postForm(handler, '/api/posted', fields, { params, headers: { cookie } })
  return { status: answer.status, to: answer.headers.get('location') ?? '' }
}
