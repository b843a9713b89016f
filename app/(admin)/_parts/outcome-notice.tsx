import { Notice } from '@/components/ui/notice'
import { reasonWords } from '@/lib/messages/reasons'
import { settingsWords as words } from '@/lib/messages/settings'
import { getFormDraft } from '@/lib/queries/forms/get-form-draft'

type Props = { draft?: string | undefined; form: string; saved?: string | undefined }

/** What became of the last press of a button: saved, or refused and why. Nothing when nothing was pressed. */
export async function OutcomeNotice({ draft, form, saved }: Props) {
  const refused = await getFormDraft(draft, form)
  if (refused) {
    const sentences = Object.values(refused.errors)
    return (
      <Notice kind="stopped" title={words.notDone} live>
        {sentences.length > 0 ? sentences.join(' ') : reasonWords(refused.reason)}
      </Notice>
    )
  }
  if (saved === undefined) return null
  return (
    <Notice kind="done" title={words.saved} live>
      {words.savedWords}
    </Notice>
  )
}
