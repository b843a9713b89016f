/** Text as somebody typed it: blank lines make paragraphs, single ones stay. */
export function PlainText({ text }: { text: string }) {
  const paragraphs = text.split(/\n{2,}/).filter((each) => each.trim() !== '')
  return (
    <div className="flex max-w-words flex-col gap-3">
      {paragraphs.map((paragraph, index) => (
        <p key={index} className="whitespace-pre-line">
          {paragraph.trim()}
        </p>
      ))}
    </div>
  )
}
