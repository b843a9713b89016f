import { expect, type APIRequestContext, type BrowserContext } from '@playwright/test'

export type Mail = {
  id: string
  to: string
  subject: string
  text: string
  html: string
  headers: Record<string, string>
  at: string
}

/** Published test numbers: see lib/gateways/payments/fake/cards.ts. */
export const CARD = {
  pays: '4242 4242 4242 4242',
  asksAlways: '4000 0027 6000 3184',
  refused: '4000 0000 0000 0002',
  refusedLater: '4000 0000 0000 0341',
} as const

/** The sandbox's calls (http.md), made as the browser's own pages would make them. */
export class Sandbox {
  constructor(
    private readonly request: APIRequestContext,
    private readonly baseUrl: string,
  ) {}

  /** Signs the context in as a demo person or a new customer; the second factor counts as given. */
  async signIn(context: BrowserContext, email: string): Promise<void> {
    const answer = await context.request.post(`${this.baseUrl}/sandbox/sign-in`, {
      data: { email },
      headers: { origin: this.baseUrl },
    })
    expect(answer.status(), await answer.text()).toBeLessThan(400)
  }

  async mailsTo(to: string): Promise<Mail[]> {
    const answer = await this.request.get(`${this.baseUrl}/sandbox/mail.json?to=${encodeURIComponent(to)}`)
    expect(answer.status()).toBe(200)
    return ((await answer.json()) as { items: Mail[] }).items
  }

  /** Waits for the newest mail to somebody whose subject fits; `since` leaves out mails seen before. */
  async mail(to: string, subject: RegExp, since: readonly Mail[] = []): Promise<Mail> {
    const seen = new Set(since.map(({ id }) => id))
    let found: Mail | undefined
    await expect
      .poll(
        async () => {
          found = (await this.mailsTo(to)).find((mail) => !seen.has(mail.id) && subject.test(mail.subject))
          return found?.subject ?? (await this.mailsTo(to)).map((mail) => mail.subject)
        },
        { message: `a mail to ${to} with ${subject}`, timeout: 30_000, intervals: [100, 200, 400] },
      )
      .toMatch(subject)
    return found!
  }

  async pay(payUrl: string, card: string): Promise<'captured' | 'failed'> {
    const answer = await this.request.post(`${this.baseUrl}/sandbox/pay`, {
      data: { payUrl, card },
      timeout: 120_000,
    })
    expect(answer.status(), await answer.text()).toBe(200)
    return ((await answer.json()) as { outcome: 'captured' | 'failed' }).outcome
  }

  /** Lets business time pass; back once everything due has been done and every mail is out. */
  async pass(hours: number): Promise<Date> {
    const answer = await this.request.post(`${this.baseUrl}/sandbox/clock`, {
      data: { advanceHours: hours },
      timeout: 150_000,
    })
    expect(answer.status(), await answer.text()).toBe(200)
    return new Date(((await answer.json()) as { now: string }).now)
  }
}

/** The first link of a mail's plain text that leads to this part of ours. */
export function linkIn(mail: Mail, path: string): string {
  const found = new RegExp(`https?://[^\\s<>"]+${path}[^\\s<>")]*`).exec(mail.text)?.[0]
  if (!found) throw new Error(`no link to ${path} in "${mail.subject}":\n${mail.text}`)
  return found
}
