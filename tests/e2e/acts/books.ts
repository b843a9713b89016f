import { expect } from '@playwright/test'
import type { TestApplication } from '@/scripts/support/test-application.mjs'
import type { Compared } from '@/tests/support/books'

/** The ledger balances and says what the provider's own lists say. */
export async function expectBooksAgree(
  application: TestApplication,
  counted: { charges: number; refunds: number },
): Promise<void> {
  const { code, output } = await application.run('tests/e2e/fixtures/compare-books.ts')
  expect(code, output).toBe(0)
  const compared = JSON.parse(output.trim().split('\n').at(-1)!) as Compared
  expect(compared).toMatchObject({ wrong: [], ...counted })
}
