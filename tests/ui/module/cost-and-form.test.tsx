import { render, screen, waitFor, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { afterEach, describe, expect, test, vi } from 'vitest'
import { CountryPrices } from '@/components/module/country-prices'
import { DeliveryTable } from '@/components/module/delivery-table'
import { CautionsSheet } from '@/components/module/reading-sheets'
import { SignUpForm } from '@/components/module/sign-up-form'
import type { OfferDelivery } from '@/lib/contracts/modules'
import { delivered, offer, page } from './sample-page'

const tax = { pricesIncludeTax: true, taxNote: null }
const table = (offers: OfferDelivery[], given = tax) =>
  render(<DeliveryTable delivery={{ country: 'DE', currency: 'EUR', offers }} tax={given} />)

describe('the prices for a country', () => {
  test('stand with deposit, postage and sum, and say which tax is in them', () => {
    table([delivered()])
    const row = screen.getByRole('row', { name: /Kit/ })
    expect(
      within(row)
        .getAllByRole('cell')
        .map((cell) => cell.textContent),
    ).toEqual(['Price€95.00', 'Deposit now€25.00', 'Postage€4.90', 'In all€99.90'])
    expect(screen.getByText('Prices and postage include 19 % tax.')).toBeVisible()
  })

  test('say where tax is added, is none, or is explained by the workshop', () => {
    const { rerender } = table([delivered()], { ...tax, pricesIncludeTax: false })
    expect(screen.getByText(/with 19 % tax added/)).toBeVisible()
    const free = { country: 'US', currency: 'EUR', offers: [delivered({ taxBasisPoints: 0 })] }
    rerender(<DeliveryTable delivery={free} tax={tax} />)
    expect(screen.getByText('No sales tax is part of these prices.')).toBeVisible()
    rerender(<DeliveryTable delivery={free} tax={{ ...tax, taxNote: 'No VAT under § 19 UStG.' }} />)
    expect(screen.getByText('No VAT under § 19 UStG.')).toBeVisible()
  })

  test('say where it is not posted, with the maker’s reason, and what customs may ask', () => {
    table([
      delivered({ state: 'paused', reason: 'The post takes none at present.', postageMinor: null }),
      delivered({ offer: 'built', duties: 'buyer_pays', note: 'Checked in March.' }),
    ])
    expect(screen.getByText('Kit: The post takes none at present.')).toBeVisible()
    expect(within(screen.getByRole('row', { name: /Kit/ })).getByText('not posted there')).toBeVisible()
    expect(screen.getByText(/Customs may ask you for tax/)).toBeVisible()
    expect(screen.getByText('Checked in March.')).toBeVisible()
  })
})

describe('another country', () => {
  afterEach(() => vi.unstubAllGlobals())
  const show = () =>
    render(
      <CountryPrices
        workshop="hollow-pier"
        module="rowlock"
        home="DE"
        countries={[
          { value: 'AT', label: 'Austria' },
          { value: 'DE', label: 'Germany' },
        ]}
        tax={tax}
      >
        <p>home prices</p>
      </CountryPrices>,
    )
  const choose = (value: string) =>
    userEvent.selectOptions(screen.getByLabelText(/Country it goes to/), value)

  test('is asked of the server when it is chosen, and the own one comes back without asking', async () => {
    const delivery = { country: 'AT', currency: 'EUR', offers: [delivered({ postageMinor: 990 })] }
    const asked = vi.fn(async (_address: string) => Response.json({ delivery }))
    vi.stubGlobal('fetch', asked)
    show()
    expect(asked).not.toHaveBeenCalled()
    await choose('AT')
    expect(await screen.findByText('One piece, delivered to Austria')).toBeVisible()
    expect(asked).toHaveBeenCalledWith('/api/w/hollow-pier/rowlock?country=AT')
    await choose('DE')
    expect(screen.getByText('home prices')).toBeVisible()
    expect(asked).toHaveBeenCalledTimes(1)
  })

  test('that cannot be loaded says so at the field and leaves the prices there were', async () => {
    vi.stubGlobal('fetch', async () => new Response('', { status: 503 }))
    show()
    await choose('AT')
    await waitFor(() => expect(screen.getByLabelText(/Country it goes to/)).toHaveAttribute('aria-invalid'))
    expect(screen.getByText(/could not be loaded/)).toBeVisible()
    expect(screen.getByText('home prices')).toBeVisible()
  })
})

describe('the form', () => {
  const form = (offers: Parameters<typeof SignUpForm>[0]['offers'], kept?: object) =>
    render(<SignUpForm workshop="hollow-pier" module="rowlock" currency="EUR" offers={offers} form={kept} />)

  test('asks for no price while the price is fixed', () => {
    form([offer()])
    expect(screen.queryByText(/highest price/)).toBeNull()
    expect(screen.getByRole('radio', { name: /Kit/ })).toBeChecked()
  })

  test('asks by the list while it is open, says for which form, and that everyone pays the same', () => {
    const open = offer({ priceMinor: null, depositMinor: null, priceListMinor: [8500, 9500] })
    form([open, offer({ offer: 'built', priceMinor: 16500 })])
    const group = screen.getByRole('group', { name: /highest price/ })
    expect(within(group).getAllByRole('radio')).toHaveLength(3)
    expect(group).toHaveTextContent('everyone pays the same price. Asked for: kit.')
    expect(within(group).getByRole('radio', { name: /85.00/ })).toHaveAttribute('value', '8500')
  })

  test('comes back with what was typed and its mistakes', () => {
    const values = { offer: 'kit', quantity: '11', email: 'no address', certainty: 'likely', updates: 'on' }
    form([offer()], { values, errors: { quantity: 'Enter a whole number from 1 to 10.' } })
    expect(screen.getByRole('alert')).toHaveTextContent('Enter a whole number from 1 to 10.')
    expect(screen.getByLabelText(/How many/)).toHaveValue('11')
    expect(screen.getByLabelText(/E-mail address/)).toHaveValue('no address')
    expect(screen.getByRole('radio', { name: /Likely/ })).toBeChecked()
    expect(screen.getByRole('checkbox')).toBeChecked()
  })
})

test('forms cautioned alike are cautioned once', () => {
  const offers = [offer({ cautions: 'Hot iron.' }), offer({ offer: 'boards', cautions: 'Hot iron.' })]
  render(<CautionsSheet page={page({ offers: [...offers, offer({ offer: 'built' })] })} />)
  expect(screen.getAllByText('Hot iron.')).toHaveLength(1)
  expect(screen.getByText('Cautions: kit, PCB and front panel set')).toBeVisible()
})
