const RESISTORS = ['1k', '2k2', '4k7', '10k', '22k', '47k', '100k', '220k', '470k', '1M']
const CAPACITORS = ['10p', '22p', '47p', '100p', '220p', '470p', '1n', '2n2', '4n7', '10n']
const HEAD = 'code,value,designators,per_unit,kit,description'

/** A parts list as a maker keeps one: resistors, capacitors and jacks, each line a part of its own. Invented. */
export function believableList(lines: number): string {
  const rows = Array.from({ length: lines }, (_, i) => {
    const number = i + 1
    if (i % 3 === 0) return `RES-${number},${RESISTORS[(i / 3) % 10]},R${number},1,buyer,Resistor 1 % 0603`
    if (i % 3 === 1)
      return `CAP-${number},${CAPACITORS[((i - 1) / 3) % 10]},C${number},1,buyer,Capacitor 50 V 0603`
    return `JACK-${number},,J${number},1,buyer,Jack socket 3.5 mm`
  })
  return [HEAD, ...rows].join('\n')
}

type Fault = { line: number; words: RegExp }

/** The same list with ten mistakes people make, each with the line it stands at and what should be said there. */
export function plantFaults(text: string): { text: string; faults: Fault[] } {
  const lines = text.split('\n')
  const faults: Fault[] = []
  const change = (line: number, to: (row: string[]) => string[], words: RegExp) => {
    lines[line - 1] = to((lines[line - 1] ?? '').split(',')).join(',')
    faults.push({ line, words })
  }
  const put = (at: number, cell: string) => (row: string[]) => row.map((each, i) => (i === at ? cell : each))
  change(5, put(0, ''), /code for the part/)
  change(14, put(3, '1.5'), /whole number/)
  change(23, put(3, '-2'), /whole number/)
  change(32, put(4, 'robot'), /assembler, maker or buyer/)
  change(41, put(1, '=B12'), /formula/)
  change(50, put(0, 'RES-1'), /twice/)
  change(59, (row) => [...row, 'surplus'], /7 cells/)
  // The list can be read with these, but the check says so at their lines.
  change(70, put(2, '??'), /cannot be read/)
  change(80, put(3, '3'), /more or fewer designators/)
  change(92, put(1, 'lots'), /value cannot be read/)
  return { text: lines.join('\n'), faults }
}
