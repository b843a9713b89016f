import { expect, type Page } from '@playwright/test'
import { generateSync } from 'otplib'
import { secondFactorWords } from '@/lib/messages/second-factor'
import { signInWords } from '@/lib/messages/sign-in'
import { paths } from '@/lib/paths'
import { formTo } from '@/tests/support/browser/forms'
import { linkIn, type Sandbox } from '@/tests/support/browser/sandbox'

/** Signs in as everybody does: by the link of a mail, opened in the same browser. */
export async function signInByMail(page: Page, sandbox: Sandbox, email: string): Promise<void> {
  const before = await sandbox.mailsTo(email)
  await page.goto(paths.signIn())
  await (await formTo(page, paths.api.signIn).fill({ email })).press(signInWords.send, /\/signin\/sent/)
  const mail = await sandbox.mail(email, /sign/i, before)
  await page.goto(new URL(linkIn(mail, '/signin/link')).pathname)
  await formTo(page, paths.api.signInCallback).press(signInWords.go, /\/account/)
}

/** Sets up the authenticator where a deed asked for a code, and gives the first one. Goes on to `leadsTo`. */
export async function setUpSecondFactor(page: Page, leadsTo: RegExp): Promise<void> {
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(secondFactorWords.title)
  const secret = (await page.locator('p.figures').first().textContent()) ?? ''
  const form = await formTo(page, paths.api.secondFactor).fill({
    code: generateSync({ secret: secret.trim() }),
  })
  await form.press(secondFactorWords.go, leadsTo)
}
