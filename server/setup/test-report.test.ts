import { mkdtempSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { reportOf } from './test-report.mjs'
import { countVitest } from './test-runners.mjs'

const result = (name: string, passed: number, failed: number, skipped: number) => ({
  name,
  passed,
  failed,
  skipped,
  seconds: 1,
  output: '',
})

const lastLine = (text: string) => text.split('\n').at(-1)

function reportFile(counts: Record<string, number>): string {
  const file = join(mkdtempSync(join(tmpdir(), 'report-')), 'report.json')
  writeFileSync(file, JSON.stringify(counts))
  return file
}

describe('the report of a test run', () => {
  it('ends with the sums over all runners', () => {
    const { text, ok } = reportOf([result('unit', 40, 0, 2), result('lint', 1, 0, 0)], 3)
    expect(lastLine(text)).toBe('41 passed, 0 failed, 2 skipped')
    expect(ok).toBe(true)
  })

  it('is no success where one test failed', () => {
    const { text, ok } = reportOf([result('unit', 40, 1, 0), result('lint', 1, 0, 0)], 3)
    expect(lastLine(text)).toBe('41 passed, 1 failed, 0 skipped')
    expect(ok).toBe(false)
  })

  it('is no success where nothing ran', () => {
    expect(reportOf([], 0)).toMatchObject({ ok: false })
    expect(reportOf([result('unit', 0, 0, 3)], 0)).toMatchObject({ ok: false })
  })
})

describe('the counts of one runner', () => {
  const some = { numPassedTests: 3, numFailedTests: 0, numPendingTests: 1, numTodoTests: 1 }

  it('are those of its report, tests put off among the skipped', () => {
    expect(countVitest(reportFile(some), 0)).toEqual({ passed: 3, failed: 0, skipped: 2 })
  })

  it('hold a failure where the runner failed and no test did', () => {
    expect(countVitest(reportFile(some), 1)).toEqual({ passed: 3, failed: 1, skipped: 2 })
  })

  it('hold a failure where there is no report, and where no test passed', () => {
    expect(countVitest('/nowhere/report.json', 1)).toEqual({ passed: 0, failed: 1, skipped: 0 })
    expect(countVitest(reportFile({ ...some, numPassedTests: 0 }), 0)).toMatchObject({ failed: 1 })
  })
})
