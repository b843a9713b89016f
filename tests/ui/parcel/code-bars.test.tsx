import { render } from '@testing-library/react'
import { expect, test } from 'vitest'
import { CodeBars } from '@/components/parcel/code-bars'
import { code128 } from '@/lib/papers/code-128'
import { readCode128 } from '@/tests/emails/papers/read-code-128'

test.each(['7', '1042', 'HP-1042'])('the drawn bars read as %s, which stands beneath them too', (text) => {
  const { container } = render(<CodeBars widths={code128(text)} text={text} />)
  const bars = [...container.querySelectorAll('rect')].map((rect) => {
    const [x, width, height] = ['x', 'width', 'height'].map((name) => Number(rect.getAttribute(name))) as [
      number,
      number,
      number,
    ]
    return { x, y: 0, width, height }
  })
  expect(readCode128(bars, 1)).toBe(text)
  expect(Math.min(...bars.map(({ x }) => x))).toBe(10)
  expect(container.querySelector('figcaption')?.textContent).toBe(text)
})
