import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { Block, Boundary } from '../../../shared/contract/block.ts'
import { cornersOfRing } from '../../../shared/geo/boundaryCorners.ts'
import { boundaryParts } from '../../../shared/geo/boundaryParts.ts'
import { formatPoints } from '../../../shared/geo/formatPoints.ts'
import { isSameOutline } from '../../../shared/geo/isSameOutline.ts'
import { quantityFor } from '../../../shared/messages/readFigure.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import { ApiError } from '../../api/errors.ts'
import type { Submitted } from '../../stores/outbox.ts'
import { findCautions, type Caution } from './blockCautions.ts'
import { areaWords, lengthWords, type BlockWords } from './blockWords.ts'
import { outlineWords } from './outlineWords.ts'
import { boundaryOf, countPoints } from './shape.ts'
import { useAsked, type Asked } from './useAsked.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useMessages } from '../app/useMessages.ts'
import { useShape, type ShapeWork } from './useShape.ts'
import { useShapeDraft, type ShapeDraft } from './useShapeDraft.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'
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
  /** What is unlikely and was asked about, its sentences ready to read. */
  cautions: ComputedRef<readonly { code: string; sentences: readonly string[] }[]>
  /** Words by field. */
  errors: ComputedRef<Record<string, string>>
  impossible: ComputedRef<readonly string[]>
  /** What is unlikely, as seen from this device. */
  unlikely: ComputedRef<readonly string[]>
  figures: ComputedRef<{ area: string; perimeter: string; points: string; difference: string }>
  /** The figures beside what they were. */
  facts: ComputedRef<readonly { term: string; figure: string }[]>
  banner: ComputedRef<string>
  refusal: ComputedRef<string>
  saving: Ref<boolean>
  save: () => Promise<Submitted<Block> | undefined>
  /** Writes the outer ring into the field of typed points. */
  beginTyping: () => void
  /** The outline somebody else gave the block meanwhile, beside the one drawn here; null while there is none. */
  conflict: ComputedRef<OutlineConflict | null>
}

/** Two outlines of one block, of which one is chosen. */
export interface OutlineConflict { code: string; theirs: Boundary; theirArea: string; theirVersion: number; mine: Boundary | null; myArea: string }

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

  watch([work.geometry, work.findings, draft.isStale], () => {
    asked.forget()
    fault.value = ''
  })
  const impossible = computed(() => work.findings.value.map((finding) => outlineWords(language.value, finding)))
  const cautions = computed(() => (work.geometry.value === null ? [] : findCautions(work.geometry.value, blocks.value.filter((other) => other.id !== id()), farm.value?.place ?? null)))

  const sentencesOf = ({ sentences }: Caution): string[] => sentences.map((each) => (typeof each === 'string' ? each : render(each)))
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
        await place.query.refetch()
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
    if (draft.isStale.value) fault.value = t('shapes.conflict.choose')
    else if (typed.errors.value.length > 0 && text.value !== '') fault.value = typed.errors.value.join(' ')
    else if (geometry === null || draft.content.value.shape.open !== null) fault.value = impossible.value[0] ?? t('shapes.reshape.impossible')
    else if (isSameOutline(geometry, of.geometry)) fault.value = t('shapes.reshape.unchanged')
    return fault.value !== '' || geometry === null ? undefined : task.run(of, geometry)
  }

  const conflict = computed<OutlineConflict | null>(() => (block.value === null || !draft.isStale.value ? null : {
    code: block.value.code, theirs: block.value.geometry, theirArea: block.value.areaText, theirVersion: block.value.version,
    mine: boundaryOf(draft.content.value.shape.parts), myArea: figures.value.area,
  }))
  const figures = computed(() => figuresOf(place, block.value, work, countPoints(draft.content.value.shape)))
  return {
    block, draft, work, typed, text, asked, conflict, impossible, figures, save, beginTyping,
    saving: task.running,
    cautions: computed(() => asked.asked.value.map((caution) => ({ code: caution.code, sentences: sentencesOf(caution) }))),
    unlikely: computed(() => cautions.value.flatMap(sentencesOf)),
    errors: computed(() => Object.fromEntries(Object.entries(asked.errors.value).map(([path, error]) => [path, 'words' in error ? error.words : t(error.id)]))),
    facts: computed(() => {
      const { area, perimeter, points, difference } = figures.value
      const facts = [
        { term: t('shapes.while.was', { version: block.value?.version ?? 0 }), figure: block.value?.areaText ?? '' }, { term: t('shapes.while.now'), figure: area },
        { term: t('shapes.while.difference'), figure: difference }, { term: t('blocks.while.perimeter'), figure: perimeter }, { term: t('shapes.while.points'), figure: points },
      ]
      return area === '' ? facts.filter(({ figure }, index) => index < 2 || figure !== '') : facts
    }),
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
    work.typeRing(points)
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

function figuresOf({ language, reader }: BlocksPlace, block: BlockWords | null, work: ShapeWork, points: number): { area: string; perimeter: string; points: string; difference: string } {
  const measure = work.measure.value
  const count = formatNumber(points, { digits: 0 }, language.value)
  if (measure === null) return { area: '', perimeter: '', points: count, difference: '' }
  const moreM2 = Math.round(measure.areaM2 - (block?.areaM2 ?? 0))
  return {
    area: areaWords(reader.value, measure.areaM2), perimeter: lengthWords(reader.value, measure.perimeterM), points: count,
    difference: `${moreM2 < 0 ? '−' : '+'}${quantityFor(reader.value, Math.abs(moreM2), 'm2', { digits: 0 })}`,
  }
}
