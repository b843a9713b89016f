import { render, screen } from '@testing-library/react'
import { describe, expect, test } from 'vitest'
import { ModuleSummary } from '@/components/module/module-summary'
import { StructuredData } from '@/components/module/structured-data'
import { page, run } from './sample-page'

const button = () => screen.getAllByRole('link')[0]!

describe('the way in', () => {
  test('is registering interest while no run takes deposits', () => {
    render(<ModuleSummary page={page()} />)
    expect(button()).toHaveTextContent('Register interest, free of charge')
    expect(button()).toHaveAttribute('href', '#interest')
    expect(screen.getByText(/12 people have said they would like one; 15 units in all/)).toBeVisible()
  })

  test('is ordering while one does, from its least deposit', () => {
    render(<ModuleSummary page={page({ run: run() })} />)
    expect(button()).toHaveTextContent('Order with a deposit from €25.00')
    expect(button()).toHaveAttribute('href', '/account/order/hollow-pier/rowlock')
    expect(screen.getByText(/41 of 60 under deposit; 17 days left, until 1 April 2027/)).toBeVisible()
  })

  test('is the waiting list once every place is taken', () => {
    render(<ModuleSummary page={page({ run: run({ isFull: true }) })} />)
    expect(button()).toHaveTextContent('Join the waiting list')
  })

  test('is interest again once the run is locked, or decide-by has passed', () => {
    const { unmount } = render(
      <ModuleSummary
        page={page({ run: run({ state: 'locked', takesOrders: false, lockedOn: '2027-04-02' }) })}
      />,
    )
    expect(button()).toHaveAttribute('href', '#interest')
    expect(screen.getByText(/The run is locked with 41 units under deposit/)).toBeVisible()
    expect(screen.queryByText(/days left/)).toBeNull()
    unmount()
    render(<ModuleSummary page={page({ run: run({ daysLeft: -1, takesOrders: false }) })} />)
    expect(button()).toHaveAttribute('href', '#interest')
    expect(screen.getByText(/The last day for deposits has passed/)).toBeVisible()
  })

  test('is closed while the workshop is suspended, and the page says why', () => {
    const { workshop } = page()
    render(<ModuleSummary page={page({ workshop: { ...workshop, isOpen: false } })} />)
    expect(screen.queryByRole('link')).toBeNull()
    expect(screen.getByRole('note')).toHaveTextContent('Orders already placed go on')
  })
})

test('the head start is told with its end; hidden interest is not counted out', () => {
  const early = run({ isOpenToAll: false, opensToAllAt: '2027-03-03T09:00:00.000Z' })
  render(<ModuleSummary page={page({ run: early, interest: null })} />)
  expect(screen.getByText('3 March 2027, 10:00 CET')).toBeVisible()
  expect(screen.getByText(/only people who registered interest and were invited can order/)).toBeVisible()
  expect(screen.getByText(/once there are ten/)).toBeVisible()
})

test('silence after the lock stands in sight', () => {
  render(<ModuleSummary page={page({ run: run({ state: 'locked', takesOrders: false, silentDays: 34 }) })} />)
  expect(screen.getByRole('note')).toHaveTextContent('No news for 34 days')
})

test('forms promised for the same day share a line; else each has its own', () => {
  const offers = run().offers
  const two = [...offers, { ...offers[0]!, offer: 'boards' as const }]
  const { unmount } = render(<ModuleSummary page={page({ run: run({ offers: two }) })} />)
  expect(screen.getAllByText(/^Posted by/)).toHaveLength(1)
  unmount()
  const apart = [two[0]!, { ...two[1]!, postedBy: '2027-06-30' }]
  render(<ModuleSummary page={page({ run: run({ offers: apart }) })} />)
  expect(screen.getByText('Posted by (PCB and front panel set)')).toBeVisible()
})

test('a maker’s text cannot end the element of the structured data', () => {
  const { module } = page()
  const evil = { ...module, oneLine: '</script><script>alert(1)</script>' }
  const { container } = render(
    <StructuredData page={page({ module: evil, run: run() })} baseUrl="https://runs.example.org" />,
  )
  const script = container.querySelector('script')!
  expect(script.innerHTML).not.toContain('<')
  expect(JSON.parse(script.innerHTML)).toMatchObject({
    '@type': 'Product',
    description: '</script><script>alert(1)</script>',
    url: 'https://runs.example.org/w/hollow-pier/rowlock',
    offers: [{ price: '95.00', priceCurrency: 'EUR', availability: 'https://schema.org/PreOrder' }],
  })
})
