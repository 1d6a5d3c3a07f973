import type { Planting, SoilContact } from '../../../shared/contract/planting.ts'
import { understood } from '../../composables/form/understood.ts'

export interface HarvestDraft { from: string | null; to: string | null; note: string }

/** A planting as it is being typed. */
export interface PlantingDraft {
  /** An outline inside the block; null for all of it. */
  part: Planting['part']
  crop: string
  variety: string
  eppo: string
  plantedOn: string | null
  removedOn: string | null
  plants: string
  ediblePart: string
  soilContact: SoilContact | 'unsaid'
  harvests: HarvestDraft[]
}

export const plantingDraft = (planting: Planting | null): PlantingDraft => ({
  part: planting?.part ?? null,
  crop: planting?.crop ?? '',
  variety: planting?.variety ?? '',
  eppo: planting?.eppo ?? '',
  plantedOn: planting?.plantedOn ?? null,
  removedOn: planting?.removedOn ?? null,
  plants: planting?.plants === undefined || planting.plants === null ? '' : String(planting.plants),
  ediblePart: planting?.ediblePart ?? '',
  soilContact: planting?.soilContact ?? 'unsaid',
  harvests: (planting?.harvests ?? []).map(({ from, to, note }) => ({ from, to, note: note ?? '' })),
})

const wordsOrNull = (text: string): string | null => (text.trim() === '' ? null : text)

/** A whole number a person meant; what is none goes as it stands and is refused at its field. */
export function wholeOrNull(text: string): number | string | null {
  if (text.trim() === '') return null
  const read = understood(text)
  return /^\d+$/.test(read) ? Number(read) : read
}

/** What is sent of a planting. */
export const plantingBody = (draft: PlantingDraft): Record<string, unknown> => ({
  part: draft.part,
  crop: draft.crop,
  variety: wordsOrNull(draft.variety),
  eppo: wordsOrNull(draft.eppo),
  plantedOn: draft.plantedOn,
  removedOn: draft.removedOn,
  plants: wholeOrNull(draft.plants),
  ediblePart: wordsOrNull(draft.ediblePart),
  soilContact: draft.soilContact === 'unsaid' ? null : draft.soilContact,
  harvests: draft.harvests.map(({ from, to, note }) => ({ from: from ?? '', to: to ?? '', note: wordsOrNull(note) })),
})
