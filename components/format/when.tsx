import { writtenInstant } from '@/lib/messages/written'

/** An instant, with the zone it is told in. */
export function When({ at, zone, locale }: { at: Date | string; zone: string; locale?: string }) {
  return <time dateTime={new Date(at).toISOString()}>{writtenInstant(at, { zone, locale })}</time>
}
