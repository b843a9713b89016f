import '@testing-library/jest-dom/vitest'
import { cleanup } from '@testing-library/react'
import { afterEach, beforeEach, expect, vi } from 'vitest'

const complaints: string[] = []

// A console error is a defect the assertions did not look for.
beforeEach(() => {
  complaints.length = 0
  vi.spyOn(console, 'error').mockImplementation(
    (...parts: unknown[]) => void complaints.push(parts.map(String).join(' ')),
  )
})

afterEach(() => {
  cleanup()
  vi.restoreAllMocks()
  expect(complaints, 'console.error was called').toEqual([])
})
