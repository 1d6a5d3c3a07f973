import type { CreateMaterial, LabelLimits } from '../../../shared/contract/input.ts'
import { understood, understoodOrNull } from '../../composables/form/understood.ts'

/** A material as it is being typed: every figure is text. */
export interface MaterialDraft {
  name: string
  kind: CreateMaterial['kind'] | null
  measuredIn: CreateMaterial['measuredIn']
  organicStatus: CreateMaterial['organicStatus']
  statusBasis: string
  hasLabel: boolean
  maxRate: string
  maxRateUnit: string
  minStrengthPct: string
  maxStrengthPct: string
  reEntryHours: string
  preHarvestDays: string
  source: string
}

/** An empty form with a unit for the label's rate: measured by volume, status not known until someone says so. */
export const emptyMaterial = (maxRateUnit = 'L/ha'): MaterialDraft => ({
  name: '', kind: null, measuredIn: 'volume', organicStatus: 'unknown', statusBasis: '', hasLabel: false,
  maxRate: '', maxRateUnit, minStrengthPct: '', maxStrengthPct: '', reEntryHours: '', preHarvestDays: '', source: '',
})

const wordsOrNull = (text: string): string | null => (text.trim() === '' ? null : text)

/** What is sent; half-typed figures go as they stand and are refused at their field. */
export function materialBody(id: string, draft: MaterialDraft): Record<string, unknown> {
  return {
    id,
    name: draft.name,
    kind: draft.kind,
    measuredIn: draft.measuredIn,
    organicStatus: draft.organicStatus,
    statusBasis: wordsOrNull(draft.statusBasis),
    label: draft.hasLabel ? labelBody(draft) : null,
  }
}

function labelBody(draft: MaterialDraft): Record<keyof LabelLimits, unknown> {
  const days = understoodOrNull(draft.preHarvestDays)
  return {
    maxRate: draft.maxRate.trim() === '' ? null : { value: understood(draft.maxRate), unit: draft.maxRateUnit },
    minStrengthPct: understoodOrNull(draft.minStrengthPct),
    maxStrengthPct: understoodOrNull(draft.maxStrengthPct),
    reEntryHours: understoodOrNull(draft.reEntryHours),
    preHarvestDays: days === null ? null : Number(days),
    source: wordsOrNull(draft.source),
  }
}
