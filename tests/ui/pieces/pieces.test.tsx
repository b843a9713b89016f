import { fireEvent, render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { expect, test, vi } from 'vitest'
import { Button } from '@/components/ui/button'
import { CheckAnswers } from '@/components/ui/check-answers'
import { CopyText } from '@/components/ui/copy-text'
import { Dialog } from '@/components/ui/dialog'
import { Progress } from '@/components/ui/progress'
import { Sheet } from '@/components/ui/sheet'
import { SiteFrame } from '@/components/ui/site-frame'
import { StateMark } from '@/components/ui/state-mark'
import { StepsList } from '@/components/ui/steps-list'
import { Tabs } from '@/components/ui/tabs'

test('the first thing reached by keyboard is the way to the content', async () => {
  render(
    <SiteFrame links={[{ href: '/a', label: 'A', current: true }]} bench>
      <h1>Page</h1>
    </SiteFrame>,
  )
  await userEvent.tab()
  expect(document.activeElement).toHaveTextContent('Skip to the content')
  expect(document.activeElement).toHaveAttribute('href', '#main')
  expect(screen.getByRole('main')).toHaveAttribute('id', 'main')
  expect(screen.getByRole('link', { name: 'A' })).toHaveAttribute('aria-current', 'page')
  expect(screen.getByRole('contentinfo')).toHaveTextContent('Terms')
})

test('a button submits unless told otherwise', () => {
  render(<Button>Send</Button>)
  expect(screen.getByRole('button', { name: 'Send' })).toHaveAttribute('type', 'submit')
})

test('a state is said in a word; its mark is silent', () => {
  const { container } = render(<StateMark kind="stopped">Called off</StateMark>)
  expect(container).toHaveTextContent('Called off')
  expect(container.querySelector('svg')).toHaveAttribute('aria-hidden', 'true')
})

test('progress is a bar with words', () => {
  render(<Progress label="Charging" done={23} total={41} failed={2} />)
  const bar = screen.getByRole('progressbar', { name: 'Charging' })
  expect(bar).toHaveAttribute('aria-valuenow', '23')
  expect(bar).toHaveAttribute('aria-valuetext', '23 of 41')
  expect(screen.getByText('2 did not succeed')).toBeVisible()
})

test('nothing to do is no progress, not a fault', () => {
  render(<Progress label="Charging" done={0} total={0} />)
  expect(screen.getByRole('progressbar')).toHaveAttribute('aria-valuetext', '0 of 0')
})

test('the sheet is a region named by its title, with its title block', () => {
  render(
    <Sheet id="s" title="Costs" titleBlock={{ what: 'Run 1', sheet: { number: 1, of: 2 } }}>
      x
    </Sheet>,
  )
  expect(within(screen.getByRole('region', { name: 'Costs' })).getByText('1 of 2')).toBeVisible()
})

test('steps, tabs and answers say where one is', () => {
  render(
    <>
      <StepsList steps={[{ key: 'a', title: 'Pay', state: 'now' }]} />
      <Tabs label="Pages" tabs={[{ href: '#a', label: 'Costs', current: true }]} />
      <CheckAnswers answers={[{ key: 'a', question: 'Form', answer: 'Kit', changeHref: '/change' }]} />
    </>,
  )
  expect(screen.getByRole('listitem', { current: 'step' })).toHaveTextContent('now')
  expect(screen.getByRole('link', { current: 'page' })).toHaveTextContent('Costs')
  expect(screen.getByRole('link', { name: 'Change Form' })).toHaveAttribute('href', '/change')
})

test('the dialog opens as a modal, and without JavaScript its opener is a link', () => {
  // jsdom draws no modal; what is checked is that the native one is asked for.
  const showModal = vi.fn()
  HTMLDialogElement.prototype.showModal = showModal
  render(
    <Dialog opener="Call off" title="Before you go on" href="/call-off">
      x
    </Dialog>,
  )
  const opener = screen.getByRole('link', { name: 'Call off' })
  expect(opener).toHaveAttribute('href', '/call-off')
  fireEvent.click(opener)
  expect(showModal).toHaveBeenCalledOnce()
})

test('copying says that it was done, and a refused clipboard does not lie', async () => {
  const user = userEvent.setup()
  render(<CopyText text="RB123456785IE" label="tracking number" />)
  await user.click(screen.getByRole('button', { name: 'Copy tracking number' }))
  expect(await screen.findByRole('status')).toHaveTextContent('Copied')
  expect(await navigator.clipboard.readText()).toBe('RB123456785IE')
})

test('a clipboard that refuses leaves the text and the offer', async () => {
  const user = userEvent.setup()
  vi.spyOn(navigator.clipboard, 'writeText').mockRejectedValue(new Error('no'))
  render(<CopyText text="RB123456785IE" label="tracking number" />)
  await user.click(screen.getByRole('button', { name: 'Copy tracking number' }))
  expect(screen.getByRole('status')).toHaveTextContent('')
  expect(screen.getByText('RB123456785IE')).toBeVisible()
})
