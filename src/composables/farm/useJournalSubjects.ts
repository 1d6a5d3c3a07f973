import { computed, type ComputedRef } from 'vue'
import type { JournalEntry, JournalFilter } from '../../../shared/contract/journal.ts'
import type { JournalKind } from '../../../shared/journal/journalActions.ts'
import { useSession } from '../../stores/session.ts'
import { useBlocks } from '../block/useBlocks.ts'
import { useLots } from '../input/useLots.ts'
import { useMaterials } from '../input/useMaterials.ts'
import { usePeople } from '../people/usePeople.ts'
import { useSprayers } from './useSprayers.ts'

interface Option { value: string; label: string }

/** The things that deeds of the chosen kind can be about: those the farm has, else those that stand in the deeds read so far. */
export function useJournalSubjects(filter: () => JournalFilter, entries: () => readonly JournalEntry[]): { subjects: ComputedRef<Option[]>; nameOf: ComputedRef<string> } {
  const session = useSession()
  const farmId = (): string => session.farmId
  const blocks = useBlocks(farmId)
  const people = usePeople(farmId)
  const materials = useMaterials(farmId)
  const lots = useLots(farmId)
  const sprayers = useSprayers(farmId)

  const listed = computed<Partial<Record<JournalKind, Option[]>>>(() => ({
    block: (blocks.data.value ?? []).map(({ id, code, name }) => ({ value: id, label: `${code} ${name}` })),
    person: (people.data.value ?? []).map(({ id, name }) => ({ value: id, label: name })),
    material: (materials.data.value ?? []).map(({ id, name }) => ({ value: id, label: name })),
    lot: (lots.data.value ?? []).map(({ id, code }) => ({ value: id, label: code })),
    sprayer: (sprayers.data.value ?? []).map(({ id, code, name }) => ({ value: id, label: `${code} ${name}` })),
  }))
  const read = computed(() => {
    const { kind } = filter()
    const found = entries().flatMap(({ action, subject, subjectId }) => (subject === null || subjectId === null || action.split('.')[0] !== kind ? [] : [{ value: subjectId, label: subject }]))
    return [...new Map(found.map((option) => [option.value, option])).values()]
  })
  const nameOf = computed(() => {
    const { subject } = filter()
    const known = [...Object.values(listed.value).flat(), ...read.value].find(({ value }) => value === subject)
    return known?.label ?? entries().find(({ subjectId, subject: name }) => subjectId === subject && name !== null)?.subject ?? ''
  })
  return {
    nameOf,
    subjects: computed(() => {
      const { kind, subject } = filter()
      const options = (kind === undefined ? undefined : listed.value[kind]) ?? read.value
      return subject === undefined || options.some(({ value }) => value === subject) ? options : [{ value: subject, label: nameOf.value }, ...options]
    }),
  }
}
