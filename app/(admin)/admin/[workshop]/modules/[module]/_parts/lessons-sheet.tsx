import { Sheet } from '@/components/ui/sheet'
import { StateMark } from '@/components/ui/state-mark'
import type { LessonDesk, ModuleDesk } from '@/lib/contracts/module-desk'
import { modulesAdminWords as words } from '@/lib/messages/modules-admin'
import { SettleLesson } from './settle-lesson'

type Props = { slug: string; module: string; desk: ModuleDesk }

/** What was learned, newest first, each with what became of it. */
export function LessonsSheet({ slug, module, desk }: Props) {
  return (
    <Sheet title={words.lessons} id="lessons">
      {desk.lessons.length === 0 ? <p className="text-quiet">{words.noLessons}</p> : null}
      <ul className="flex flex-col">
        {desk.lessons.map((lesson) => (
          <li key={lesson.id} className="border-b border-rule py-3">
            <div className="flex flex-wrap items-baseline justify-between gap-x-4">
              <p className="max-w-words font-semibold">{lesson.symptom}</p>
              <Standing lesson={lesson} />
            </div>
            <p className="text-15 text-quiet">{words.lessonFound(lesson.foundOn)}</p>
            {[lesson.howFound, lesson.cause, lesson.remedy]
              .filter((text) => text !== '')
              .map((text) => (
                <p key={text} className="max-w-words text-15">
                  {text}
                </p>
              ))}
            {lesson.mendedIn === null && lesson.waivedReason === null ? (
              <SettleLesson
                slug={slug}
                module={module}
                lesson={lesson.id}
                later={desk.revisions
                  .map(({ letter }) => letter)
                  .filter((letter) => letter !== lesson.foundOn)}
              />
            ) : null}
          </li>
        ))}
      </ul>
    </Sheet>
  )
}

function Standing({ lesson }: { lesson: LessonDesk }) {
  if (lesson.mendedIn !== null)
    return <StateMark kind="done">{words.lessonMended(lesson.mendedIn)}</StateMark>
  if (lesson.waivedReason !== null)
    return <StateMark kind="attention">{words.lessonWaived(lesson.waivedReason)}</StateMark>
  return <StateMark kind="open">{words.lessonOpen}</StateMark>
}
