import type { journal } from '../messages/en/journal.ts'

type Actions = typeof journal.action
/** What a deed is about: the first part of its name. */
export type JournalKind = keyof Actions
/** A deed as the journal names it, `record.signed`; one without words in `shared/messages` does not compile. */
export type JournalAction = { [Kind in JournalKind]: `${Kind}.${keyof Actions[Kind] & string}` }[JournalKind]

const KINDS: Record<JournalKind, true> = {
  record: true, file: true, block: true, planting: true, bed: true, event: true, site: true, ground: true,
  material: true, lot: true, sprayer: true, calibration: true, farm: true, certificate: true, start: true, practice: true, grant: true, plan: true, job: true, report: true,
  person: true, phone: true, paper: true, invitation: true, letter: true,
}
/** Every kind of thing that deeds are about. */
export const JOURNAL_KINDS = Object.keys(KINDS) as JournalKind[]
