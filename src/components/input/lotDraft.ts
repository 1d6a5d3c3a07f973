import type { CreateLot, Lot } from '../../../shared/contract/input.ts'
import { understood } from '../../composables/form/understood.ts'

/** A lot as it is being typed. */
export interface LotDraft {
  materialId: string | null
  code: string
  origin: CreateLot['origin']
  source: string
  receivedOn: string | null
  value: string
  unit: string
  expiresOn: string | null
}

/** An empty form, received today. @param today civil date of the farm. */
export const emptyLot = (materialId: string | null, unit: string, today: string): LotDraft => ({
  materialId, code: '', origin: 'bought', source: '', receivedOn: today, value: '', unit, expiresOn: null,
})

/** What is sent; a half-typed figure goes as it stands and is refused at its field. */
export const lotBody = (id: string, draft: LotDraft): Record<string, unknown> => ({
  id,
  materialId: draft.materialId ?? '',
  code: draft.code,
  origin: draft.origin,
  source: draft.source.trim() === '' ? null : draft.source,
  receivedOn: draft.receivedOn ?? '',
  quantity: { value: understood(draft.value), unit: draft.unit },
  expiresOn: draft.expiresOn,
})

/** A count as it is being typed. */
export interface CountDraft {
  value: string
  unit: string
  reason: string
}

/** What is sent of a count, against the revision of the lot that is shown. */
export const countBody = (id: string, lot: Pick<Lot, 'revision'>, draft: CountDraft): Record<string, unknown> => ({
  id,
  revision: lot.revision,
  left: { value: understood(draft.value), unit: draft.unit },
  reason: draft.reason,
})
