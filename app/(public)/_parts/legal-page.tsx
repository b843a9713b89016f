import { PublicFrame } from '@/components/site/public-frame'
import { Words } from '@/components/ui/columns'
import { PageHead } from '@/components/ui/page-head'
import type { LegalText } from '@/lib/messages/legal'

/** A page of plain text about this site. */
export function LegalPage({ text }: { text: LegalText }) {
  return (
    <PublicFrame>
      <PageHead title={text.title} lead={text.lead} />
      <Words>
        {text.sections.map(({ heading, body }) => (
          <section key={heading} className="flex flex-col gap-3">
            <h2>{heading}</h2>
            {body.map((part, index) =>
              typeof part === 'string' ? (
                <p key={index}>{part}</p>
              ) : (
                <ul key={index}>
                  {part.map((line) => (
                    <li key={line}>{line}</li>
                  ))}
                </ul>
              ),
            )}
          </section>
        ))}
      </Words>
    </PublicFrame>
  )
}
