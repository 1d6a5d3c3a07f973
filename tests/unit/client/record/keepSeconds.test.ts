import { describe, expect, it } from 'vitest'
import { recordContentSchema } from '../../../../shared/contract/recordContent.ts'
import { keepSeconds } from '../../../../src/composables/record/keepSeconds.ts'

const [one, two] = ['01890000-0000-7000-8000-000000000001', '01890000-0000-7000-8000-000000000002'] as [string, string]
const content = (lines: object[]) => recordContentSchema.parse({ method: 'foliar', lines })
const standing = content([
  { blockId: one, startedAt: '2026-06-16T13:00:30.500Z', endedAt: '2026-06-16T13:40:10Z' },
  { blockId: one, startedAt: '2026-06-16T15:00:05Z', endedAt: '2026-06-16T15:20:59Z' },
]).lines

describe('keepSeconds', () => {
  it.each([
    { name: 'a time that was not touched', typed: { blockId: one, startedAt: '2026-06-16T13:00:00Z', endedAt: '2026-06-16T13:40:00Z' }, start: '2026-06-16T13:00:30.500Z', end: '2026-06-16T13:40:10Z' },
    { name: 'the second span on one block', typed: { blockId: one, startedAt: '2026-06-16T08:00:00-07:00', endedAt: '2026-06-16T15:20:00Z' }, start: '2026-06-16T15:00:05Z', end: '2026-06-16T15:20:59Z' },
    { name: 'an end that was changed', typed: { blockId: one, startedAt: '2026-06-16T13:00:00Z', endedAt: '2026-06-16T13:45:00Z' }, start: '2026-06-16T13:00:30.500Z', end: '2026-06-16T13:45:00Z' },
    { name: 'another block', typed: { blockId: two, startedAt: '2026-06-16T13:00:00Z', endedAt: null }, start: '2026-06-16T13:00:00Z', end: null },
  ])('says of $name what stands or was typed', ({ typed, start, end }) => {
    expect(keepSeconds(content([typed]), standing).lines[0]).toMatchObject({ startedAt: start, endedAt: end })
  })
})
