type Props = {
  src: string
  alt: string
  width: number
  height: number
  srcSet?: string
  sizes?: string
  caption?: React.ReactNode
  /** A drawing is dark lines on nothing: it gets white paper under it in both themes. */
  kind?: 'photo' | 'drawing'
  /** Above the fold: fetched at once. */
  first?: boolean
}

/** A picture in a hairline frame with its caption, its place kept while it loads. */
export function Picture({ caption, kind = 'photo', first, alt, ...image }: Props) {
  return (
    <figure>
      <img
        {...image}
        alt={alt}
        loading={first ? 'eager' : 'lazy'}
        fetchPriority={first ? 'high' : undefined}
        decoding="async"
        className={`border-rule h-auto max-w-full border ${kind === 'drawing' ? 'bg-[#fff] p-3' : 'bg-sheet'}`}
      />
      {caption ? <figcaption className="text-13 text-quiet pt-1">{caption}</figcaption> : null}
    </figure>
  )
}
