import { AddressLines } from '@/components/parcel/address-lines'
import { CodeBars } from '@/components/parcel/code-bars'
import { code128 } from '@/lib/papers/code-128'
import type { Block } from '@/lib/papers/blocks'
import { PaperTableView } from './paper-table-view'

/** A piece of a paper as the page prints it; the PDF draws the same list. */
export function BlockView({ block }: { block: Block }) {
  switch (block.kind) {
    case 'title':
      return <h2 className="text-28">{block.text}</h2>
    case 'heading':
      return <h3 className="pt-3 text-17">{block.text}</h3>
    case 'text':
      return (
        <p
          className={`py-1 whitespace-pre-line ${block.strong ? 'font-semibold' : ''} ${block.small ? 'text-13' : 'text-15'}`}
        >
          {block.text}
        </p>
      )
    case 'address':
      return (
        <div className="py-2">
          {block.label ? <p className="text-13 text-quiet">{block.label}</p> : null}
          <AddressLines lines={block.lines} />
        </div>
      )
    case 'code':
      return (
        <div className="py-2">
          <CodeBars widths={code128(block.text)} text={block.text} />
        </div>
      )
    case 'rule':
      return <hr className="my-2 border-ink" />
    case 'facts':
      return (
        <dl className="grid grid-cols-[minmax(8rem,36%)_1fr] gap-x-3 gap-y-1 py-2 text-15">
          {block.facts.map(({ name, value }) => (
            <div key={name} className="contents">
              <dt className="text-quiet">{name}</dt>
              <dd>{value}</dd>
            </div>
          ))}
        </dl>
      )
    case 'boxes':
      return (
        <div className="py-2">
          <p className="text-13 text-quiet">{block.label}</p>
          <ul className="grid gap-x-6 sm:grid-cols-2">
            {block.boxes.map(({ text, isTicked }) => (
              <li key={text} className="flex items-center gap-2 text-15">
                <span
                  aria-hidden="true"
                  className="inline-flex size-4 shrink-0 items-center justify-center border border-ink leading-none"
                >
                  {isTicked ? '×' : ''}
                </span>
                {text}
              </li>
            ))}
          </ul>
        </div>
      )
    case 'sign':
      return (
        <p className="mt-10 border-t border-ink pt-1 text-13">
          {[block.name, block.value].filter(Boolean).join(': ')}
        </p>
      )
    case 'pair':
      return (
        <div className="grid gap-x-6 sm:grid-cols-2">
          {[block.left, block.right].map((side, index) => (
            <div key={index}>
              {side.map((each, at) => (
                <BlockView key={at} block={each} />
              ))}
            </div>
          ))}
        </div>
      )
    case 'table':
      return <PaperTableView table={block} />
  }
}
