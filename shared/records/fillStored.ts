import type { Computed } from '../contract/record.ts'
import type { RecordContent } from '../contract/recordContent.ts'
import { mapPlainFields } from './plainFields.ts'

const BLANK_CONTENT = { components: [], water: null, sprayerId: null, workedInOn: null, weather: null, protection: [], ...mapPlainFields(() => null), doneById: null }
const BLANK_LINE = { part: { kind: 'whole' as const }, counts: {}, stage: null, bbch: null }
/** Figures that the first schema did not have, and those of its loads: not said. */
export const BLANK_COMPUTED = { counts: {}, totalKg: null, kgPerHa: null, sprayPerEach: null, lines: [], air: null }
export const BLANK_LOADS = { fullMinutes: null, lastMinutes: null }

/** A record's content as it was stored, with the fields that were not asked for then. */
export function fillContent(stored: RecordContent): RecordContent {
  return {
    ...BLANK_CONTENT,
    ...stored,
    lines: stored.lines.map((line) => ({ ...BLANK_LINE, ...line })),
    components: stored.components.map((component) => ({
      ...component,
      used: (component.used as typeof component.used | undefined) ?? null,
      basis: component.basis.kind === 'ratio' ? { ...component.basis, reading: (component.basis.reading as 'to' | 'in' | undefined) ?? 'to' } : component.basis,
    })),
  }
}

/** Figures as they were stored, likewise. */
export function fillComputed(stored: Computed): Computed {
  return {
    ...BLANK_COMPUTED,
    ...stored,
    loads: stored.loads && { ...BLANK_LOADS, ...stored.loads },
  }
}
