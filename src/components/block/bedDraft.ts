import type { Bed, BedKind } from '../../../shared/contract/bed.ts'
import { understoodOrNull } from '../../composables/form/understood.ts'
import { wholeOrNull } from './plantingDraft.ts'

/** Beds or rows as they are being typed. */
export interface BedDraft {
  kind: BedKind
  numbered: boolean
  from: string
  to: string
  name: string
  count: string
  lengthM: string
  widthM: string
  plants: string
  endedOn: string | null
}

const text = (value: number | string | null | undefined): string => (value === null || value === undefined ? '' : String(value))

export const bedDraft = (bed: Bed | null): BedDraft => ({
  kind: bed?.kind ?? 'row',
  numbered: bed === null || bed.fromNumber !== null,
  from: text(bed?.fromNumber),
  to: text(bed?.toNumber),
  name: bed?.name ?? '',
  count: text(bed?.count),
  lengthM: text(bed?.lengthM),
  widthM: text(bed?.widthM),
  plants: text(bed?.plants),
  endedOn: bed?.endedOn ?? null,
})

/** What is sent; numbers make the count, and half-typed figures are refused at their fields. */
export function bedBody(draft: BedDraft): Record<string, unknown> {
  const [fromNumber, toNumber] = draft.numbered ? [wholeOrNull(draft.from), wholeOrNull(draft.to)] : [null, null]
  const count = typeof fromNumber === 'number' && typeof toNumber === 'number' ? Math.max(1, toNumber - fromNumber + 1) : wholeOrNull(draft.count)
  return {
    kind: draft.kind,
    name: draft.name.trim() === '' ? null : draft.name,
    // Numbered and nothing typed is a number missing, not a name.
    fromNumber: draft.numbered ? fromNumber ?? '' : null,
    toNumber: draft.numbered ? toNumber ?? '' : null,
    count: draft.numbered && typeof count !== 'number' ? 1 : count ?? '',
    lengthM: understoodOrNull(draft.lengthM),
    widthM: understoodOrNull(draft.widthM),
    plants: wholeOrNull(draft.plants),
    endedOn: draft.endedOn,
  }
}
