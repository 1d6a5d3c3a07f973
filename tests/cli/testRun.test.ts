import { describe, expect, it } from 'vitest'
import { OneLine } from '../../server/cli/lib/OneLine.mjs'
import { parseTestArguments } from '../../server/cli/lib/testArguments.mjs'
import { addCounts, countPlaywright, countVitest, countsLine } from '../../server/cli/lib/testCounts.mjs'

describe('parseTestArguments', () => {
  it.each([
    { args: [], kinds: ['static', 'unit', 'api', 'e2e'], rest: [] },
    { args: ['--only', 'api', 'tests/api/blocks.test.ts'], kinds: ['api'], rest: ['tests/api/blocks.test.ts'] },
    { args: ['--only=e2e,unit'], kinds: ['unit', 'e2e'], rest: [] },
    { args: ['--only', 'static', '--only', 'unit'], kinds: ['static', 'unit'], rest: [] },
    { args: ['tests/e2e/story.spec.ts'], kinds: ['e2e'], rest: ['tests/e2e/story.spec.ts'] },
    { args: ['tests/reference/area.test.ts'], kinds: ['unit'], rest: ['tests/reference/area.test.ts'] },
  ])('reads $args', ({ args, kinds, rest }) => {
    expect(parseTestArguments(args)).toEqual({ kinds, rest })
  })

  it.each([['--only'], ['--only', 'browser']])('refuses %s %s', (...args) => {
    expect(() => parseTestArguments(args)).toThrow(OneLine)
  })
})

describe('countVitest', () => {
  const result = { numPassedTests: 5, numFailedTests: 0, numPendingTests: 1, numTodoTests: 1, testResults: [{ status: 'passed', assertionResults: [{ status: 'passed' }] }] }

  it('counts what passed, failed and was skipped', () => {
    expect(countVitest(JSON.stringify(result), 0)).toEqual({ passed: 5, failed: 0, skipped: 2 })
  })

  it('counts a file that could not be loaded as one failure', () => {
    const broken = { ...result, testResults: [{ status: 'failed', assertionResults: [] }] }
    expect(countVitest(JSON.stringify(broken), 1)).toEqual({ passed: 5, failed: 1, skipped: 2 })
  })

  it('does not count a failed test twice', () => {
    const failing = { ...result, numFailedTests: 1, testResults: [{ status: 'failed', assertionResults: [{ status: 'failed' }] }] }
    expect(countVitest(JSON.stringify(failing), 1)).toEqual({ passed: 5, failed: 1, skipped: 2 })
  })

  it('counts an exit that nothing explains as one failure', () => {
    expect(countVitest(JSON.stringify(result), 1).failed).toBe(1)
  })

  it.each([undefined, '', '{"numPassed'])('counts a crash as one failure: %s', (text) => {
    expect(countVitest(text, 0)).toEqual({ passed: 0, failed: 1, skipped: 0 })
  })
})

describe('countPlaywright', () => {
  const withStats = (stats: Record<string, number>): string => JSON.stringify({ stats: { expected: 4, unexpected: 0, flaky: 0, skipped: 0, ...stats } })

  it.each([
    { stats: {}, code: 0, counts: { passed: 4, failed: 0, skipped: 0 } },
    { stats: { unexpected: 2, skipped: 1 }, code: 1, counts: { passed: 4, failed: 2, skipped: 1 } },
    { stats: { flaky: 1 }, code: 0, counts: { passed: 4, failed: 1, skipped: 0 } },
    { stats: {}, code: 1, counts: { passed: 4, failed: 1, skipped: 0 } },
  ])('counts $stats with exit $code', ({ stats, code, counts }) => {
    expect(countPlaywright(withStats(stats), code)).toEqual(counts)
  })
})

describe('the last line', () => {
  it('adds the kinds up', () => {
    const counts = addCounts([{ passed: 5, failed: 0, skipped: 0 }, { passed: 12, failed: 1, skipped: 2 }])
    expect(countsLine(counts)).toBe('17 passed, 1 failed, 2 skipped')
  })
})
