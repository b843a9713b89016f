import { writtenDay } from '@/lib/messages/written'

/** A calendar day in full. */
export function DayText({ day, weekday, locale }: { day: string; weekday?: boolean; locale?: string }) {
  return <time dateTime={day}>{writtenDay(day, { weekday, locale })}</time>
}
