import { Button } from '@/components/ui/button'
import { TextField } from '@/components/ui/text-field'
import { sandboxWords } from '@/lib/messages/sandbox'
import { paths } from '@/lib/paths'

const words = sandboxWords.mail

/** Mails to one receiver; the address stands in the page's own address, so that it can be kept. */
export function FilterForm({ to }: { to: string | undefined }) {
  return (
    <form action={paths.sandboxMail()} className="flex flex-wrap items-end gap-3 pb-6">
      <TextField name="to" type="email" label={words.show} defaultValue={to} optional />
      <Button kind="secondary">{words.filter}</Button>
      {to ? <a href={paths.sandboxMail()}>{words.all}</a> : null}
    </form>
  )
}
