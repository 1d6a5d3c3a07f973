import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Block } from '../../shared/contract/block.ts'
import { cornersOfRing } from '../../shared/geo/boundaryCorners.ts'
import { boundaryParts } from '../../shared/geo/boundaryParts.ts'
import { formatPoints } from '../../shared/geo/formatPoints.ts'
import { isSameOutline } from '../../shared/geo/isSameOutline.ts'
import { formatNumber } from '../../shared/units/formatQuantity.ts'
import { ApiError } from '../api/errors.ts'
import type { Submitted } from '../stores/outbox.ts'
import { findCautions, type Caution } from './blockCautions.ts'
import { hectaresText, metresText, type BlockWords } from './blockWords.ts'
import { outlineWords } from './outlineWords.ts'
import { boundaryOf, countPoints } from './shape.ts'
import { useAsked, type Asked } from './useAsked.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useMessages } from './useMessages.ts'
import { useShape, type ShapeWork } from './useShape.ts'
import { useShapeDraft, type ShapeDraft } from './useShapeDraft.ts'
import { useSubmit } from './useSubmit.ts'
import { useTask } from './useTask.ts'
import { useTypedPoints, type TypedPoints } from './useTypedPoints.ts'

/** The page that changes one block's outline: the work on it, its words, and saving it. */
export interface BlockReshape {
  block: ComputedRef<BlockWords | null>
  draft: ShapeDraft
  work: ShapeWork
  typed: TypedPoints
  /** The outer ring as typed; null until it is taken to the field. */
  text: Ref<string>
  asked: Asked
  cautions: ComputedRef<readonly Caution[]>
  sentencesOf: (caution: Caution) => string[]
  impossible: ComputedRef<readonly string[]>
  figures: ComputedRef<{ area: string; perimeter: string; points: string; difference: string }>
  banner: ComputedRef<string>
  refusal: ComputedRef<string>
  saving: Ref<boolean>
  save: () => Promise<Submitted<Block> | undefined>
  /** Writes the outer ring into the field of typed points. */
  beginTyping: () => void
}

export function useBlockReshape(id: () => string, place: BlocksPlace): BlockReshape {
  const { blocks, farmId, language, farm } = place
  const { t } = useI18n()
  const { render, problem } = useMessages()
  const { submit } = useSubmit()
  const block = computed(() => blocks.value.find((each) => each.id === id()) ?? null)
  const draft = useShapeDraft(farmId, block)
  const work = useShape(draft.content)
  const asked = useAsked()
  const fault = ref('')
  const { text, typed, beginTyping } = useTypedRing(work, draft, () => language.value)

  watch([work.geometry, work.findings], () => {
    asked.forget()
    fault.value = ''
  })
  const impossible = computed(() => work.findings.value.map((finding) => outlineWords(language.value, finding)))
  const cautions = computed(() => (work.geometry.value === null ? [] : findCautions(work.geometry.value, blocks.value.filter((other) => other.id !== id()), farm.value?.place ?? null)))

  const task = useTask(async (of: Block, geometry: NonNullable<typeof work.geometry.value>): Promise<Submitted<Block> | undefined> => {
    const { note, revision } = draft.content.value
    if (!asked.hasReasons(cautions.value)) return undefined
    try {
      const saved = await submit({
        kind: 'block.update', farmId: farmId.value, id: of.id,
        body: { revision, geometry: { ...geometry }, note: note.trim() === '' ? null : note, acknowledged: asked.acknowledged() },
      })
      await draft.discard()
      return saved
    } catch (error) {
      if (error instanceof ApiError && error.problem.status === 409) {
        fault.value = t('shapes.reshape.stale', { code: of.code })
        await place.query.refetch()
        draft.content.value = { ...draft.content.value, revision: block.value?.revision ?? revision }
        return undefined
      }
      if (!asked.takeRefusal(error)) throw error
      return undefined
    }
  })

  async function save(): Promise<Submitted<Block> | undefined> {
    const { value: of } = block
    const { value: geometry } = work.geometry
    fault.value = ''
    if (of === null || task.running.value) return undefined
    if (typed.errors.value.length > 0 && text.value !== '') fault.value = typed.errors.value.join(' ')
    else if (geometry === null || draft.content.value.shape.open !== null) fault.value = impossible.value[0] ?? t('shapes.reshape.impossible')
    else if (isSameOutline(geometry, of.geometry)) fault.value = t('shapes.reshape.unchanged')
    return fault.value !== '' || geometry === null ? undefined : task.run(of, geometry)
  }

  const figures = computed(() => figuresOf(place, block.value, work, countPoints(draft.content.value.shape)))
  return {
    block, draft, work, typed, text, asked, cautions, impossible, figures, save, beginTyping,
    saving: task.running,
    sentencesOf: (caution) => caution.sentences.map((each) => (typeof each === 'string' ? each : render(each))),
    refusal: computed(() => (fault.value !== '' ? fault.value : task.error.value === null ? '' : problem(task.error.value))),
    banner: computed(() => {
      const { area, perimeter, points } = figures.value
      return t(`shapes.reshape.${area === '' ? 'bannerOpen' : 'banner'}`, { code: block.value?.code ?? '', area, perimeter, points })
    }),
  }
}

/** The outer ring of the first part as typed points. */
function useTypedRing(work: ShapeWork, draft: ShapeDraft, language: () => 'en' | 'es') {
  const text = ref('')
  const typed = useTypedPoints(() => text.value, language)
  watch(typed.points, (points) => {
    const { parts } = draft.content.value.shape
    if (text.value === '' || points.length < 3 || formatPoints(points) === formatPoints(parts[0]?.[0] ?? [])) return
    const next = boundaryOf(parts.with(0, [[...points], ...(parts[0] ?? []).slice(1)]))
    if (next !== null) work.replace(next)
  })
  return {
    text, typed,
    beginTyping: () => {
      const finished = boundaryOf(draft.content.value.shape.parts)
      const ring = finished === null ? undefined : boundaryParts(finished)[0]?.[0]
      text.value = ring === undefined ? '' : formatPoints(cornersOfRing(ring))
    },
  }
}

function figuresOf({ language }: BlocksPlace, block: BlockWords | null, work: ShapeWork, points: number): { area: string; perimeter: string; points: string; difference: string } {
  const measure = work.measure.value
  const count = formatNumber(points, { digits: 0 }, language.value)
  if (measure === null) return { area: '', perimeter: '', points: count, difference: '' }
  const moreM2 = Math.round(measure.areaM2 - (block?.areaM2 ?? 0))
  return {
    area: `${hectaresText(language.value, measure.areaM2)} ha`, perimeter: metresText(language.value, measure.perimeterM), points: count,
    difference: `${moreM2 < 0 ? '−' : '+'}${formatNumber(Math.abs(moreM2), { digits: 0 }, language.value)} m²`,
  }
}
