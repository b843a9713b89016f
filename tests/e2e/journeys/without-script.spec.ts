import { signUpWords } from '@/lib/messages/signups'
import { paths } from '@/lib/paths'
import { expect, test } from '@/tests/support/e2e'
import { formTo } from '@/tests/support/browser/forms'
import { linkIn } from '@/tests/support/browser/sandbox'

test.use({ world: 'demo' })

const WORKSHOP = 'hollow-pier'
const MODULE = 'rowlock'

test('interest is registered without JavaScript; a mistake loses nothing typed', async ({
  browserOf,
  sandbox,
}) => {
  const page = await (await browserOf(undefined, { javaScriptEnabled: false })).newPage()
  const email = 'quill@without-script.example'
  await page.goto(paths.module(WORKSHOP, MODULE))
  const form = await formTo(page, paths.api.signUps).fill({
    ...{ offer: 'built', quantity: '11', country: 'AT', certainty: 'likely', email, updates: true },
  })
  await form.press(signUpWords.send, /\/form\/[\w-]+/)

  const again = formTo(page, paths.api.signUps)
  await expect(again.itself.locator('[name=email]')).toHaveValue(email)
  await expect(again.itself.locator('[name=country]')).toHaveValue('AT')
  await expect(again.itself.locator('[name=offer][value=built]')).toBeChecked()
  await expect(again.itself.locator('[name=updates]')).toBeChecked()
  await expect(page.getByText('Enter a whole number from 1 to 10.').first()).toBeVisible()
  expect(await sandbox.mailsTo(email)).toEqual([])

  await (
    await again.fill({ quantity: '1' })
  ).press(signUpWords.send, new RegExp(paths.signUpSent(WORKSHOP, MODULE)))
  const mail = await sandbox.mail(email, /confirm your interest/)
  await page.goto(new URL(linkIn(mail, '/confirm')).pathname)
  await formTo(page, paths.api.signUpConfirm).press(signUpWords.confirm, /done=1/)
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(signUpWords.confirmedTitle)

  const confirmed = await sandbox.mail(email, /is confirmed/)
  await page.goto(new URL(linkIn(confirmed, '/take-back')).pathname)
  await formTo(page, paths.api.signUpTakeBack).press(signUpWords.takeBack, /done=1/)
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(signUpWords.takenBackTitle)
})
