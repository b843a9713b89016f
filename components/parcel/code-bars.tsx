type Props = {
  /** Bars and spaces in turn, a bar first, each as a count of modules. */
  widths: readonly number[]
  /** What the bars say. */
  text: string
}

/** Modules a scanner needs blank on either side. */
const QUIET = 10
const HEIGHT = 40

/** Where each bar begins and how wide it is, in modules; spaces left out. */
function barsOf(widths: readonly number[]): { x: number; width: number }[] {
  return widths
    .map((width, i) => ({ x: QUIET + widths.slice(0, i).reduce((sum, each) => sum + each, 0), width }))
    .filter((_, i) => i % 2 === 0)
}

/** A bar code with its text beneath: black on white on any screen, so that a scanner reads it there too. */
export function CodeBars({ widths, text }: Props) {
  const total = widths.reduce((sum, width) => sum + width, 2 * QUIET)
  return (
    <figure className="bg-white text-black inline-block p-1 text-center">
      <svg
        viewBox={`0 0 ${total} ${HEIGHT}`}
        width={total * 1.6}
        height={HEIGHT}
        preserveAspectRatio="none"
        shapeRendering="crispEdges"
        aria-hidden="true"
        className="fill-black block max-w-full"
      >
        {barsOf(widths).map(({ x, width }) => (
          <rect key={x} x={x} y="0" width={width} height={HEIGHT} />
        ))}
      </svg>
      <figcaption className="figures text-13">{text}</figcaption>
    </figure>
  )
}
