import { ui } from '@/lib/messages/ui'

type Answer = { key: string; question: string; answer: React.ReactNode; changeHref?: string }

/** What was answered, to be read once more before a deed; each with a way back to change it. */
export function CheckAnswers({ answers }: { answers: readonly Answer[] }) {
  return (
    <dl className="border-ink border-t">
      {answers.map(({ key, question, answer, changeHref }) => (
        <div
          key={key}
          className="border-rule grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 border-b py-2.5 sm:grid-cols-[12rem_minmax(0,1fr)_auto]"
        >
          <dt className="text-15 text-quiet col-span-2 sm:col-span-1">{question}</dt>
          <dd>{answer}</dd>
          {changeHref ? (
            <dd>
              <a href={changeHref} className="text-15 inline-flex min-h-6">
                {ui.change} <span className="sr-only">{question}</span>
              </a>
            </dd>
          ) : null}
        </div>
      ))}
    </dl>
  )
}
