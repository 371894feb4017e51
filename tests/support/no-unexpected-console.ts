import { afterEach, beforeEach, expect, vi } from 'vitest'

// An unexpected console.error or console.warn fails the test that caused it.
beforeEach(() => {
  vi.spyOn(console, 'error')
  vi.spyOn(console, 'warn')
})

afterEach(() => {
  const errors = vi.mocked(console.error).mock.calls
  const warnings = vi.mocked(console.warn).mock.calls
  vi.restoreAllMocks()
  expect(errors, 'unexpected console.error').toEqual([])
  expect(warnings, 'unexpected console.warn').toEqual([])
})
