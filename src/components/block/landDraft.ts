import type { Block } from '../../../shared/contract/block.ts'
import type { Land } from '../../../shared/contract/land.ts'

/** How the land stands, as it is being typed. */
export interface LandDraft {
  status: Land['status'] | null
  statusSince: string | null
  knowsProhibited: boolean
  substance: string
  on: string | null
  proof: string
  tenure: NonNullable<Land['tenure']> | 'none'
  tenureUntil: string | null
  tenureNote: string
}

export const landDraft = (land: Land | null): LandDraft => ({
  status: land?.status ?? null,
  statusSince: land?.statusSince ?? null,
  knowsProhibited: land !== null && land.lastProhibited !== null,
  substance: land?.lastProhibited?.substance ?? '',
  on: land?.lastProhibited?.on ?? null,
  proof: land?.lastProhibited?.proof ?? '',
  tenure: land?.tenure ?? 'none',
  tenureUntil: land?.tenureUntil ?? null,
  tenureNote: land?.tenureNote ?? '',
})

/** What is sent, over the revision that was seen. */
export const landBody = ({ revision }: Pick<Block, 'revision'>, draft: LandDraft): Record<string, unknown> => ({
  revision,
  status: draft.status ?? '',
  statusSince: draft.statusSince,
  lastProhibited: draft.knowsProhibited ? { substance: draft.substance, on: draft.on ?? '', proof: draft.proof } : null,
  tenure: draft.tenure === 'none' ? null : draft.tenure,
  tenureUntil: draft.tenure === 'none' || draft.tenure === 'own' ? null : draft.tenureUntil,
  tenureNote: draft.tenureNote.trim() === '' ? null : draft.tenureNote,
})
