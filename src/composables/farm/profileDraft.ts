import type { Farm } from '../../../shared/contract/farm.ts'
import type { RuleSet } from '../../../shared/contract/farmProfile.ts'
import { typedCount, typedWords } from '../form/typedFigure.ts'

/** The farm's profile as it is typed. */
export interface ProfileDraft {
  name: string
  zone: string | null
  zoneReason: string
  seasonStart: string | null
  units: Farm['units']
  calibrationDays: string
  person: string
  address: string
  phone: string
  email: string
  ruleSets: RuleSet[]
}

export function draftOfProfile({ name, zone, seasonStart, units, calibrationDays, contact, ruleSets }: Farm): ProfileDraft {
  return {
    name, zone, zoneReason: '', seasonStart, units, calibrationDays: String(calibrationDays),
    person: contact?.person ?? '', address: contact?.address ?? '', phone: contact?.phone ?? '', email: contact?.email ?? '', ruleSets: [...ruleSets],
  }
}

/** The form as it is sent; the contract judges it. */
export function bodyOfProfile(draft: ProfileDraft, revision: number): unknown {
  const contact = { person: typedWords(draft.person), address: typedWords(draft.address), phone: typedWords(draft.phone), email: typedWords(draft.email) }
  return {
    revision, name: draft.name, zone: draft.zone ?? '', seasonStart: draft.seasonStart ?? '', units: draft.units, calibrationDays: typedCount(draft.calibrationDays), ruleSets: draft.ruleSets,
    contact: Object.values(contact).some((words) => words !== null) ? contact : null,
    ...(draft.zoneReason.trim() !== '' && { acknowledged: [{ code: 'farm.zone_change', reason: draft.zoneReason }] }),
  }
}
