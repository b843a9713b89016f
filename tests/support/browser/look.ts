import AxeBuilder from '@axe-core/playwright'
import { expect, type Page } from '@playwright/test'

const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa']

/** No violation of WCAG 2.2 A and AA that a program can see. */
export async function expectAccessible(page: Page): Promise<void> {
  const { violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze()
  const said = violations.map(({ id, help, nodes }) => ({
    id,
    help,
    where: nodes.slice(0, 3).map((node) => `${node.target.join(' ')}: ${node.failureSummary ?? ''}`),
  }))
  expect(said, `axe at ${page.url()}`).toEqual([])
}

/** At 320 px the page does not scroll sideways; only what is two-dimensional by nature may, inside itself. */
export async function expectReflow(page: Page): Promise<void> {
  const before = page.viewportSize()
  await page.setViewportSize({ width: 320, height: 640 })
  const wide = await page.evaluate(() => {
    const { scrollWidth, clientWidth } = document.documentElement
    if (scrollWidth <= clientWidth) return []
    const sticksOut = (element: Element) => element.getBoundingClientRect().right > clientWidth + 1
    return [...document.querySelectorAll('body *')]
      .filter((element) => sticksOut(element) && ![...element.children].some(sticksOut))
      .slice(0, 5)
      .map((element) => element.outerHTML.slice(0, 160))
      .concat(`${scrollWidth} > ${clientWidth}`)
  })
  expect(wide, `sideways scroll at 320 px of ${page.url()}`).toEqual([])
  if (before) await page.setViewportSize(before)
}

/**
 * Tab reaches everything that can be used, in the order of the page, and what has the focus shows it: an outline of
 * 2 px or more.
 */
export async function expectKeyboard(page: Page): Promise<void> {
  const wanted = await page.evaluate(() => {
    const USABLE =
      'a[href], button:not([disabled]), input:not([type=hidden]):not([disabled]), select:not([disabled]), ' +
      'textarea:not([disabled]), summary, [tabindex]:not([tabindex="-1"])'
    const isShown = (element: Element) =>
      element.checkVisibility({ visibilityProperty: true }) &&
      !element.closest('details:not([open]) > :not(summary)')
    const shown = [...document.querySelectorAll<HTMLElement>(USABLE)].filter(isShown)
    // A group of radio buttons is one stop.
    const groups = new Set<string>()
    const stops = shown.filter((element) => {
      if (!(element instanceof HTMLInputElement) || element.type !== 'radio') return true
      if (groups.has(element.name)) return false
      groups.add(element.name)
      return true
    })
    stops.forEach((element, index) => (element.dataset.stop = String(index)))
    // Tab goes on from where the browser last was; a place before everything is where a reader begins.
    const before = document.createElement('span')
    before.tabIndex = -1
    document.body.prepend(before)
    before.focus()
    return stops.length
  })
  const met: number[] = []
  const unseen: string[] = []
  // A date takes a stop for each of its parts; the page ends where nothing has the focus.
  for (let step = 0; step < wanted * 5 + 3; step += 1) {
    await page.keyboard.press('Tab')
    const focus = await page.evaluate(() => {
      const element = document.activeElement
      if (!(element instanceof HTMLElement) || element === document.body) return null
      const radios =
        element instanceof HTMLInputElement && element.type === 'radio'
          ? [...document.querySelectorAll<HTMLInputElement>('input[type=radio]')].filter(
              ({ name }) => name === element.name,
            )
          : []
      const stop = element.dataset.stop ?? radios.find((each) => each.dataset.stop)?.dataset.stop
      // The ring may be drawn on what holds the input (a file drop, a large tick).
      const ringed = [element, element.parentElement, element.nextElementSibling].some((each) => {
        if (!each) return false
        const { outlineStyle, outlineWidth } = getComputedStyle(each)
        return outlineStyle !== 'none' && parseFloat(outlineWidth) >= 2
      })
      return { stop: stop === undefined ? null : Number(stop), ringed, html: element.outerHTML.slice(0, 120) }
    })
    if (focus === null) break
    if (!focus.ringed) unseen.push(focus.html)
    if (focus.stop !== null && !met.includes(focus.stop)) met.push(focus.stop)
  }
  expect(unseen, `focus that cannot be seen at ${page.url()}`).toEqual([])
  const missed = Array.from({ length: wanted }, (_, index) => index).filter((index) => !met.includes(index))
  const missedHtml = await page.evaluate(
    (stops) => stops.map((stop) => document.querySelector(`[data-stop="${stop}"]`)?.outerHTML.slice(0, 160)),
    missed,
  )
  expect(missedHtml, `not reached by Tab at ${page.url()}`).toEqual([])
  expect(met, `tab order at ${page.url()}`).toEqual([...met].sort((a, b) => a - b))
}
