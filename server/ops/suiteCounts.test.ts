import { expect, it } from 'vitest'
import { closingLine, countPlaywright, countVitest } from './suiteCounts.mjs'

const passed = { status: 'passed' }
const failed = { status: 'failed' }

it('counts what a run of unit tests passed, failed and skipped', () => {
  const counts = countVitest({
    success: false,
    numPassedTests: 7,
    numFailedTests: 2,
    numPendingTests: 1,
    numTodoTests: 1,
    testResults: [{ status: 'failed', assertionResults: [failed, failed, passed] }],
  })

  expect(counts).toEqual({ passed: 7, failed: 2, skipped: 2 })
})

it('counts a test file that could not be loaded as one failure', () => {
  const counts = countVitest({
    success: false,
    numPassedTests: 3,
    numFailedTests: 0,
    numPendingTests: 0,
    numTodoTests: 0,
    testResults: [
      { status: 'failed', assertionResults: [] },
      { status: 'passed', assertionResults: [passed, passed, passed] },
    ],
  })

  expect(counts).toEqual({ passed: 3, failed: 1, skipped: 0 })
})

it('fails a run that says it failed though every test passed', () => {
  const counts = countVitest({
    success: false,
    numPassedTests: 1,
    numFailedTests: 0,
    numPendingTests: 0,
    numTodoTests: 0,
    testResults: [{ status: 'passed', assertionResults: [passed] }],
  })

  expect(counts.failed).toBe(1)
})

it('counts stories, and faults outside any story as failures', () => {
  const counts = countPlaywright({
    stats: { expected: 4, unexpected: 1, flaky: 1, skipped: 2 },
    errors: [{ message: 'the set-up failed' }],
  })

  expect(counts).toEqual({ passed: 5, failed: 2, skipped: 2 })
})

it('ends with one line over all suites', () => {
  expect(
    closingLine([
      { passed: 2, failed: 0, skipped: 0 },
      countPlaywright({ stats: { expected: 3, unexpected: 1, flaky: 0, skipped: 0 }, errors: [] }),
    ]),
  ).toBe('5 passed, 1 failed')
  expect(closingLine([{ passed: 2, failed: 0, skipped: 4 }])).toBe('2 passed, 0 failed, 4 skipped')
})
