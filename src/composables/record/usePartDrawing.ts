import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Block, Boundary } from '../../../shared/contract/block.ts'
import { formatPoints } from '../../../shared/geo/formatPoints.ts'
import { MOST_OUTSIDE, outsideShare } from '../../../shared/geo/outsideShare.ts'
import type { Language } from '../../../shared/messages/translate.ts'
import { usePreferences } from '../../stores/preferences.ts'
import { emptyBlockDraft, type BlockDraftContent, type OutlineBy } from '../block/blockDraftContent.ts'
import { blockWords, type BlockWords } from '../block/blockWords.ts'
import { outlineWords } from '../block/outlineWords.ts'
import { firstRing, shapeOf } from '../block/shape.ts'
import { useFigures } from '../app/useFigures.ts'
import { useShape, type ShapeWork } from '../block/useShape.ts'
import { useTypedPoints, type TypedPoints } from '../block/useTypedPoints.ts'

interface PartDrawing {
  content: Ref<BlockDraftContent>
  outline: ShapeWork
  typed: TypedPoints
  /** The block it is drawn in, as the map shows it. */
  ground: ComputedRef<BlockWords>
  summary: ComputedRef<string>
  /** Why it cannot be taken, in words; empty while nothing is wrong with what there is. */
  fault: ComputedRef<string>
  /** Corners can still be set on the map. */
  isOpen: ComputedRef<boolean>
  language: ComputedRef<Language>
  setBy: (by: OutlineBy) => void
  setTyped: (text: string) => void
  swap: () => void
  /** Closes the ring being set; where it cannot stand the reason is said. */
  finish: () => void
  /** What was drawn, closed; null while it is none, and the reason is then said. */
  take: () => Boundary | null
}

/** Drawing or typing the part of a block that was treated. */
export function usePartDrawing(block: Block, drawn: Boundary | null): PartDrawing {
  const { t } = useI18n()
  const { area, unitOf } = useFigures()
  const preferences = usePreferences()
  const language = computed(() => preferences.language)
  const content = ref<BlockDraftContent>({ ...emptyBlockDraft('draw'), ...(drawn === null ? {} : { shape: shapeOf(drawn) }) })
  const outline = useShape(content)
  const typed = useTypedPoints(() => content.value.typed, () => language.value)
  const tried = ref(false)
  watch(typed.points, (read) => { if (content.value.by === 'points') outline.typeRing(read) })

  const isOutside = computed(() => outline.geometry.value !== null && outsideShare(outline.geometry.value, block.geometry) > MOST_OUTSIDE)
  const fault = computed(() => {
    const impossible = outline.findings.value.map((finding) => outlineWords(language.value, finding)).join(' ')
    if (impossible !== '') return impossible
    if (isOutside.value) return t('problems.part.outside_block', { code: block.code })
    return tried.value && outline.geometry.value === null ? t('recordForm.part.drawMore') : ''
  })

  return {
    content, outline, typed, fault, language,
    ground: computed(() => blockWords(preferences.reader, block)),
    summary: computed(() => (outline.measure.value === null ? '' : t('recordForm.part.measures', { area: area(outline.measure.value.areaM2), of: area(block.areaM2), unit: unitOf('ha'), code: block.code }))),
    isOpen: computed(() => content.value.by === 'draw' && content.value.shape.open !== null),
    finish: () => { tried.value = !outline.finish() },
    setBy: (by) => { content.value = { ...content.value, by, typed: by === 'points' ? formatPoints([...firstRing(content.value.shape)]) : content.value.typed } },
    setTyped: (text) => { content.value = { ...content.value, typed: text } },
    swap: () => { if (typed.swapped.value !== null) content.value = { ...content.value, typed: typed.swapped.value } },
    take: () => {
      tried.value = true
      return fault.value === '' ? outline.geometry.value : null
    },
  }
}
