import type { Message } from '../contract/common.ts'
import type { VersionChange } from '../contract/recordVersions.ts'
import type { SignedRecord } from '../contract/signedRecord.ts'
import { versionFields, type VersionField } from './versionFields.ts'

/** One thing in two versions, side by side; an empty side says nothing of it. */
export interface VersionPair {
  path: string
  label: Message[]
  before: Message[]
  after: Message[]
  isChanged: boolean
}

/**
 * Two versions side by side, everything that either says.
 * @param personName the name of a person as it is now; signed text holds ids.
 */
export function pairVersions(before: SignedRecord, after: SignedRecord, personName: (id: string) => string): VersionPair[] {
  const [was, is] = [versionFields(before, personName), versionFields(after, personName)]
  const then = new Map(was.map((field) => [field.key, field]))
  const still = new Set(is.map(({ key }) => key))
  return [
    ...is.map((field) => pair(then.get(field.key), field)),
    ...was.filter(({ key }) => !still.has(key)).map((field) => pair(field, undefined)),
  ]
}

/** Every difference between two versions by its place, with what stood there before and after; nothing that differs is left out. */
export function compareVersions(before: SignedRecord, after: SignedRecord, personName: (id: string) => string): VersionChange[] {
  return pairVersions(before, after, personName)
    .filter(({ isChanged }) => isChanged)
    .map(({ path, label, before: was, after: is }) => ({ path, label, before: was, after: is }))
}

function pair(before: VersionField | undefined, after: VersionField | undefined): VersionPair {
  const { path, label } = after ?? before ?? { path: '', label: [] }
  return { path, label, before: before?.words ?? [], after: after?.words ?? [], isChanged: (before?.value ?? 'null') !== (after?.value ?? 'null') }
}
