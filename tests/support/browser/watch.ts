import type { BrowserContext, Response } from '@playwright/test'

/** An answer the journey itself provokes: a status and the end of a path. */
export type Expected = { status: number; path: string | RegExp }

/** The browser's own line about an answer; the answer itself is judged by its status. */
const LOADING = /^Failed to load resource/

/**
 * Collects what a page must never do: write errors to the console (policy violations are among them), throw, be
 * answered 4xx or 5xx unasked, or ask another machine for anything.
 */
export class Watch {
  readonly complaints: string[] = []
  private readonly expected: Expected[] = []

  constructor(private readonly ownOrigins: readonly string[]) {}

  follow(context: BrowserContext): void {
    context.on('console', (message) => {
      if (message.type() === 'error' && !LOADING.test(message.text()))
        this.complaints.push(`console at ${message.page()?.url()}: ${message.text()}`)
    })
    context.on('weberror', (error) => this.complaints.push(`uncaught: ${String(error.error())}`))
    context.on('response', (response) => this.judge(response))
    context.on('request', (request) => {
      const { origin, protocol } = new URL(request.url())
      if (/^https?:$/.test(protocol) && !this.ownOrigins.includes(origin))
        this.complaints.push(`asked ${origin} for something`)
    })
  }

  /** From now on an answer with this status from this path is what the journey wants to see. */
  expect(status: number, path: string | RegExp): void {
    this.expected.push({ status, path })
  }

  private judge(response: Response): void {
    const status = response.status()
    if (status < 400) return
    const { pathname } = new URL(response.url())
    const isExpected = this.expected.some(
      (each) =>
        each.status === status &&
        (typeof each.path === 'string' ? pathname === each.path : each.path.test(pathname)),
    )
    if (!isExpected) this.complaints.push(`${status} from ${response.request().method()} ${pathname}`)
  }
}
