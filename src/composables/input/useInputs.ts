import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { labelWords } from '../../../shared/balance/labelWords.ts'
import { pastLotChecks } from '../../../shared/balance/pastLotChecks.ts'
import { sortLots, sortMaterials } from '../../../shared/balance/sortInputs.ts'
import { judgeStatus } from '../../../shared/checks/judgeStatus.ts'
import type { Lot, Material } from '../../../shared/contract/input.ts'
import type { Check } from '../../../shared/contract/record.ts'
import { useSession } from '../../stores/session.ts'
import { useFarmDay } from '../farm/useFarmDay.ts'
import { useLots } from './useLots.ts'
import { useLotWords, type LotLine } from './useLotWords.ts'
import { useMaterials } from './useMaterials.ts'
import { useMessages } from '../app/useMessages.ts'

/** A material with its status check and its label's limits in words. */
export interface MaterialLine {
  material: Material
  check: Check
  limits: string[]
}

export interface Inputs {
  materials: ReturnType<typeof useMaterials>
  lots: ReturnType<typeof useLots>
  today: ComputedRef<string | null>
  materialLines: ComputedRef<MaterialLine[]>
  lotLines: ComputedRef<LotLine[]>
  /** Whatever needs eyes in all inputs; passes are left out. */
  attention: ComputedRef<Check[]>
  /** The same, of what the farm holds a lot of. */
  attentionHeld: ComputedRef<Check[]>
  ready: ComputedRef<boolean>
  chosenId: Ref<string | null>
  chosen: ComputedRef<MaterialLine | null>
}

/** The shelf: materials and lots in words, what needs eyes first. */
export function useInputs(): Inputs {
  const { t } = useI18n()
  const session = useSession()
  const { render } = useMessages()
  const { today } = useFarmDay()
  const farmId = computed(() => session.farmId)
  const materials = useMaterials(farmId)
  const lots = useLots(farmId)

  const day = computed(() => today.value ?? '')
  const sorted = computed<Lot[]>(() => (today.value === null ? [] : sortLots(lots.data.value ?? [], today.value)))
  const lotLines = useLotWords(sorted, day)
  const materialLines = computed(() => sortMaterials(materials.data.value ?? []).map((material) => ({
    material,
    check: judgeStatus(material, `material:${material.id}`),
    limits: limitsOf(material),
  })))

  function limitsOf({ label }: Material): string[] {
    if (label === null) return [t('inputs.label.none')]
    const found = labelWords(label).map(render)
    return found.length === 0 ? [t('inputs.label.silent')] : found
  }

  const attention = computed(() => [
    ...materialLines.value.map(({ check }) => check).filter(({ verdict }) => verdict !== 'pass'),
    ...(today.value === null ? [] : pastLotChecks(sorted.value, materials.data.value ?? [], today.value)),
  ])
  const held = computed(() => new Set(lotLines.value.filter(({ standing }) => standing.stock !== 'empty').map(({ lot }) => `material:${lot.materialId}`)))
  const attentionHeld = computed(() => attention.value.filter(({ about }) => !about?.startsWith('material:') || held.value.has(about)))
  const chosenId = ref<string | null>(null)

  return {
    materials, lots, today, materialLines, lotLines, attention, attentionHeld, chosenId,
    ready: computed(() => materials.data.value !== undefined && lots.data.value !== undefined && today.value !== null),
    chosen: computed(() => materialLines.value.find(({ material }) => material.id === chosenId.value) ?? null),
  }
}
