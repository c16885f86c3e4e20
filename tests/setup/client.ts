import '@testing-library/jest-dom/vitest'
import { cleanup, configure } from '@testing-library/react'
import { afterAll, afterEach, beforeAll, beforeEach, expect, vi } from 'vitest'
import './client-dom.ts'
import { server } from './msw/server.ts'

/** Whatever a test prints is a fault that it did not expect: an unknown request, a React warning, a stray log. */
const noise: string[] = []

// How long a test may wait for what it expects; a busy machine is slow, and a passing test never waits this out.
configure({ asyncUtilTimeout: 5_000 })
vi.setConfig({ testTimeout: 20_000 })

beforeAll(() => server.listen({ onUnhandledRequest: 'error' }))

beforeEach(() => {
  noise.length = 0
  for (const method of ['error', 'warn', 'info', 'log'] as const) {
    vi.spyOn(console, method).mockImplementation((...words: unknown[]) => {
      noise.push(`console.${method}: ${words.map(String).join(' ')}`)
    })
  }
})

afterEach(() => {
  cleanup()
  server.resetHandlers()
  localStorage.clear()
  delete document.documentElement.dataset.theme
  vi.restoreAllMocks()
  expect(noise, 'the test made noise').toEqual([])
})

afterAll(() => server.close())
