import { When } from '@/components/format/when'
import { Stack } from '@/components/ui/columns'
import { Empty } from '@/components/ui/empty'
import { Sheet } from '@/components/ui/sheet'
import { sandboxWords } from '@/lib/messages/sandbox'

const words = sandboxWords.mail

type Mail = { id: string; to: string; subject: string; text: string; at: string }

/** Each mail with its plain text; its links can be followed from here. */
export function MailList({ mails }: { mails: readonly Mail[] }) {
  if (mails.length === 0) return <Empty>{words.empty}</Empty>
  return (
    <Stack>
      {mails.map((mail) => (
        <Sheet
          key={mail.id}
          id={`mail-${mail.id}`}
          title={mail.subject}
          aside={<When at={mail.at} zone="UTC" />}
        >
          <p className="pb-2 text-15 text-quiet">
            {words.to} {mail.to}
          </p>
          <p className="max-w-words text-15 break-words whitespace-pre-wrap">{linked(mail.text)}</p>
        </Sheet>
      ))}
    </Stack>
  )
}

const LINK = /(https?:\/\/[^\s<>"]+[^\s<>".,)])/g

function linked(text: string): React.ReactNode[] {
  return text.split(LINK).map((part, index) =>
    index % 2 === 1 ? (
      <a key={index} href={part}>
        {part}
      </a>
    ) : (
      part
    ),
  )
}
