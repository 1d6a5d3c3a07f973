import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Block, Boundary } from '../../shared/contract/block.ts'
import { formatPoints } from '../../shared/geo/formatPoints.ts'
import type { Position } from '../../shared/geo/geometryTypes.ts'
import { MOST_OUTSIDE, outsideShare } from '../../shared/geo/outsideShare.ts'
import type { Language } from '../../shared/messages/translate.ts'
import { usePreferences } from '../stores/preferences.ts'
import { emptyBlockDraft, type BlockDraftContent, type OutlineBy } from './blockDraftContent.ts'
import { blockWords, type BlockWords } from './blockWords.ts'
import { crossingEdges, outlineWords } from './outlineWords.ts'
import { useFigures } from './useFigures.ts'
import { useOutline, type Outline } from './useOutline.ts'
import { useTypedPoints, type TypedPoints } from './useTypedPoints.ts'

interface PartDrawing {
  content: Ref<BlockDraftContent>
  outline: Outline
  typed: TypedPoints
  /** The block it is drawn in, as the map shows it. */
  ground: ComputedRef<BlockWords>
  summary: ComputedRef<string>
  /** Why it cannot be taken, in words; empty while nothing is wrong with what there is. */
  fault: ComputedRef<string>
  /** Corners can still be set on the map. */
  isOpen: ComputedRef<boolean>
  crossing: ComputedRef<readonly number[]>
  language: ComputedRef<Language>
  setBy: (by: OutlineBy) => void
  setTyped: (text: string) => void
  swap: () => void
  /** What was drawn, closed; null while it is none, and the reason is then said. */
  take: () => Boundary | null
}

/** The corners of an outline without holes, the first not repeated. */
function cornersOf(drawn: Boundary | null): Position[] {
  const ring = drawn?.type === 'Polygon' ? drawn.coordinates[0] : drawn?.coordinates[0]?.[0]
  return (ring ?? []).slice(0, -1).map(([lon, lat]): Position => [lon, lat])
}

/** Drawing or typing the part of a block that was treated. */
export function usePartDrawing(block: Block, drawn: Boundary | null): PartDrawing {
  const { t } = useI18n()
  const { hectares } = useFigures()
  const preferences = usePreferences()
  const language = computed(() => preferences.language)
  const points = cornersOf(drawn)
  const content = ref<BlockDraftContent>({ ...emptyBlockDraft('draw'), points, closed: points.length > 2 })
  const outline = useOutline(content)
  const typed = useTypedPoints(() => content.value.typed, () => language.value)
  const tried = ref(false)
  watch(typed.points, (read) => { if (content.value.by === 'points') outline.replace(read) })

  const isOutside = computed(() => outline.geometry.value !== null && outsideShare(outline.geometry.value, block.geometry) > MOST_OUTSIDE)
  const fault = computed(() => {
    const impossible = outline.findings.value.map((finding) => outlineWords(language.value, finding)).join(' ')
    if (impossible !== '') return impossible
    if (isOutside.value) return t('problems.part.outside_block', { code: block.code })
    return tried.value && outline.geometry.value === null ? t('recordForm.part.drawMore') : ''
  })

  return {
    content, outline, typed, fault, language,
    ground: computed(() => blockWords(language.value, block)),
    summary: computed(() => (outline.measure.value === null ? '' : t('recordForm.part.measures', { hectares: hectares(outline.measure.value.areaM2), of: hectares(block.areaM2), code: block.code }))),
    isOpen: computed(() => content.value.by === 'draw' && !content.value.closed),
    crossing: computed(() => crossingEdges(outline.findings.value)),
    setBy: (by) => { content.value = { ...content.value, by, typed: by === 'points' ? formatPoints(content.value.points) : content.value.typed } },
    setTyped: (text) => { content.value = { ...content.value, typed: text } },
    swap: () => { if (typed.swapped.value !== null) content.value = { ...content.value, typed: typed.swapped.value } },
    take: () => {
      tried.value = true
      return fault.value === '' ? outline.geometry.value : null
    },
  }
}
