import { computed, shallowRef, watch, type ComputedRef, type Ref } from 'vue'
import { recordChecks } from '../../../shared/checks/recordChecks.ts'
import { tallyChecks, type Tally } from '../../../shared/checks/tallyChecks.ts'
import type { Check } from '../../../shared/contract/record.ts'
import type { RecordSheet } from '../../../shared/mix/sheetTypes.ts'
import { laterCode, withWords } from '../app/laterPart.ts'
import { contentOf, weatherOf } from './recordContent.ts'
import type { RecordDraft } from './recordDraft.ts'
import { useClock } from '../app/useClock.ts'
import type { RecordStock } from './useRecordStock.ts'

const readLikely = laterCode(() => import('../../../shared/checks/judgeLikely.ts'))

/**
 * The checks of what is typed, by the same function that judges it again when it is signed.
 * @param happened whether times and amounts are judged that say what happened; on the second step by itself.
 */
export function useRecordChecks(draft: Ref<RecordDraft>, stock: Ref<RecordStock>, sheet: Ref<RecordSheet>, happened = (): boolean => draft.value.step === 2): {
  checks: ComputedRef<Check[]>
  tally: ComputedRef<Tally>
  /** Stops that are signed with a reason. */
  reasoned: ComputedRef<Check[]>
  /** Components whose lot is short, by the path of the lot. */
  shortLots: ComputedRef<Record<string, 'records.sign.lotShort'>>
} {
  const { time } = useClock()
  const likely = shallowRef<Parameters<typeof recordChecks>[1]>()
  // Read once there is something to ask about; without a signal the server asks.
  const stop = watch(() => happened() || weatherOf(draft.value) !== null, (isAsked) => {
    if (!isAsked) return
    void withWords(readLikely).then(({ judgeLikely }) => { likely.value = judgeLikely; stop() }, () => undefined)
  }, { immediate: true })
  const checks = computed(() => {
    const zone = stock.value.farm?.zone ?? 'UTC'
    const { method, lines, components = [] } = contentOf(draft.value, { zone, happened: happened() })
    return recordChecks({
      content: {
        method,
        lines: lines.map(({ blockId, startedAt, endedAt, amount }) => ({ blockId, startedAt: startedAt ?? null, endedAt: endedAt ?? null, amount: amount ?? null })),
        components: components.map(({ materialId, lotId, used }) => ({ materialId, lotId: lotId ?? null, used: used ?? null })),
        weather: weatherOf(draft.value),
      },
      sheet: sheet.value,
      blocks: stock.value.blocks,
      materials: stock.value.materials,
      lots: stock.value.lots,
      sprayer: stock.value.sprayers.find(({ id }) => id === draft.value.sprayerId) ?? null,
      zone,
      now: time.value.toISOString(),
    }, likely.value)
  })
  return {
    checks,
    tally: computed(() => tallyChecks(checks.value)),
    reasoned: computed(() => checks.value.filter(({ verdict }) => verdict === 'stop')),
    shortLots: computed(() => {
      const short = checks.value.filter(({ verdict, code }) => verdict === 'stop' && code === 'lot.left')
      return Object.fromEntries(short.map(({ about }) => [`${(about ?? '').replace(':', 's.')}.lotId`, 'records.sign.lotShort' as const]))
    }),
  }
}
