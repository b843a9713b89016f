import { expect, type Locator, type Page } from '@playwright/test'
import { reasonWords } from '@/lib/messages/reasons'

const TRIES = 4

type Typed = Record<string, string | boolean>

/** The form that posts to an address, as somebody fills it in: by the names of its fields, whatever kind they are. */
export function formTo(page: Page, action: string, nth = 0): Form {
  return new Form(page, page.locator(`form[action="${action}"]`).nth(nth))
}

export class Form {
  constructor(
    private readonly page: Page,
    readonly itself: Locator,
  ) {}

  async fill(typed: Typed): Promise<this> {
    for (const [name, value] of Object.entries(typed)) await this.fillOne(name, value)
    return this
  }

  /**
   * Presses a button of the form and waits for the page it leads to. Where the provider did not answer, which the sandbox
   * makes happen, it is pressed again, as the page asks.
   */
  async press(button: string | RegExp, leadsTo: RegExp): Promise<void> {
    for (let tried = 1; ; tried += 1) {
      await this.pressOnce(button)
      if (leadsTo.test(this.page.url())) return
      const said = await this.said()
      if (tried >= TRIES || !said.includes(reasonWords('provider_unreachable')))
        throw new Error(`"${String(button)}" did not lead to ${leadsTo}: ${said}`)
    }
  }

  private async pressOnce(button: string | RegExp): Promise<void> {
    const loaded = this.page.waitForEvent('load', { timeout: 30_000 })
    await Promise.all([loaded, this.itself.getByRole('button', { name: button }).first().click()]).catch(
      async (error: unknown) => {
        throw new Error(`no page came after "${String(button)}": ${await this.said()}`, { cause: error })
      },
    )
  }

  /** Where the page is, what it is called, and every sentence about a mistake on it. */
  private async said(): Promise<string> {
    const sentences = await this.page.locator('h1, [id$="-error"], [role=alert]').allInnerTexts()
    return [this.page.url(), ...sentences].join('\n')
  }

  private async fillOne(name: string, value: string | boolean): Promise<void> {
    const fields = this.itself.locator(`[name="${name}"]:not([type=hidden])`)
    await expect(fields.first(), `a field ${name}`).toBeAttached()
    const kind = await fields.first().evaluate((field) => {
      const { type, localName } = field as HTMLInputElement
      return localName === 'select' ? 'select' : type
    })
    if (kind === 'radio') return this.itself.locator(`[name="${name}"][value="${value}"]`).check()
    if (kind === 'checkbox') return fields.first().setChecked(value !== false)
    if (kind === 'select') {
      await fields.first().selectOption(String(value))
      return
    }
    await fields.first().fill(String(value))
  }
}
