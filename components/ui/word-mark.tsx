import { ui } from '@/lib/messages/ui'

/** The name with its brim: a line that leaves the last letter at the height of the small letters. */
export function WordMark({ href = '/' }: { href?: string }) {
  return (
    <a
      href={href}
      aria-label={ui.home}
      className="font-heading text-28 text-ink font-semibold tracking-tight no-underline"
    >
      {ui.siteName}
    </a>
  )
}
