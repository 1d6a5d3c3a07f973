import { useQuery } from '@tanstack/vue-query'
import { computed, toValue, type ComputedRef, type MaybeRefOrGetter } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Message } from '../../../shared/contract/common.ts'
import type { RecordVersions } from '../../../shared/contract/recordVersions.ts'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { pairVersions } from '../../../shared/records/compareVersions.ts'
import { civilDateIn, civilTimeIn } from '../../../shared/time/civilDate.ts'
import { recordApi } from '../../api/recordApi.ts'
import { useFigures } from '../app/useFigures.ts'
import { useMessages } from '../app/useMessages.ts'

/** One thing in two versions, in words; an empty side says nothing. */
export interface ComparedRow { path: string; label: string; before: string; after: string; isChanged: boolean }

/** One version as a reader finds it. */
export interface ReadVersion {
  version: number
  entry: RecordVersions['items'][number]['entry']
  reason: string
  by: string
  at: string
  /** RFC 3339. */
  signedAt: string
  digest: string
  /** Against the version before; empty for the first. */
  rows: ComparedRow[]
  changedCount: number
}

/** The signed versions of a record, newest first, each beside the one before it. */
export function useRecordVersions(
  farmId: MaybeRefOrGetter<string>, recordId: MaybeRefOrGetter<string>, isSigned: MaybeRefOrGetter<boolean>,
): { versions: ComputedRef<ReadVersion[]>; signed: ComputedRef<SignedRecord | null>; signerIds: ComputedRef<string[]> } {
  const [farm, id] = [computed(() => toValue(farmId)), computed(() => toValue(recordId))]
  const figures = useFigures()
  const { t } = useI18n()
  const { render } = useMessages()
  const query = useQuery({
    queryKey: ['records', farm, 'versions', id],
    enabled: () => farm.value !== '' && toValue(isSigned),
    queryFn: () => recordApi.versions(farm.value, id.value),
  })
  const said = (messages: readonly Message[]): string => messages.map(render).join(', ')

  return {
    /** What the newest version says; null while it is read. */
    signed: computed(() => query.data.value?.items.at(-1)?.signed ?? null),
    signerIds: computed(() => (query.data.value?.items ?? []).flatMap(({ signedBy }) => signedBy?.id ?? [])),
    versions: computed(() => {
      const { items = [], people = [] } = query.data.value ?? {}
      const nameOf = (person: string): string => people.find((one) => one.id === person)?.name ?? ''
      return items.map(({ version, entry, reason, signedBy, signedAt, signedWith, digest, signed, changes }, index): ReadVersion => {
        const before = items[index - 1]?.signed
        const { zone } = signed.farm
        return {
          version, entry, reason: reason ?? '', by: signedBy !== null && signedWith === 'pin' ? t('people.signedByPin', { name: signedBy.name }) : signedBy?.name ?? '', digest, signedAt,
          at: `${figures.day(civilDateIn(zone, signedAt))}, ${civilTimeIn(zone, signedAt)}`,
          rows: before ? pairVersions(before, signed, nameOf).map((row) => ({ path: row.path, label: said(row.label), before: said(row.before), after: said(row.after), isChanged: row.isChanged })) : [],
          changedCount: changes.length,
        }
      }).reverse()
    }),
  }
}
