import { computed, watch, type ComputedRef } from 'vue'
import type { Block } from '../../../shared/contract/block.ts'
import { renderMessage } from '../../../shared/messages/renderMessage.ts'
import { translate } from '../../../shared/messages/translate.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { Submitted } from '../../stores/outbox.ts'
import type { Caution } from './blockCautions.ts'
import type { OutlineBy } from './blockDraftContent.ts'
import { areaWords, lengthWords } from './blockWords.ts'
import { outlineWords } from './outlineWords.ts'
import { countPoints } from './shape.ts'
import type { FieldError } from './useAsked.ts'
import { useBlockSave, type BlockSave } from './useBlockSave.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useBlockWork, type BlockWork } from './useBlockWork.ts'
import { useMessages } from '../app/useMessages.ts'

/** The new block's page: the work on its outline, its words, and saving it. */
export interface BlockNew {
  work: BlockWork
  saving: BlockSave
  /** Figures in words; empty while nothing is enclosed. */
  figures: ComputedRef<{ area: string; perimeter: string; points: string }>
  /** The figures beside the map; empty ones are not there yet. */
  facts: ComputedRef<readonly { term: string; figure: string }[]>
  /** "New block: 0.93 ha, perimeter 414 m, 14 points". */
  banner: ComputedRef<string>
  /** What is impossible, in words. */
  impossible: ComputedRef<readonly string[]>
  /** What is unlikely, as seen from this device, in words. */
  unlikely: ComputedRef<readonly string[]>
  asked: ComputedRef<readonly { code: string; sentences: string[] }[]>
  errors: ComputedRef<Record<string, string>>
  refusal: ComputedRef<string>
  /** Closes the outline; says why where it cannot stand. */
  finish: () => void
  /** Saves; answers what was saved, or undefined where something is still missing. */
  save: () => Promise<{ code: string; area: string; outcome: Submitted<Block> } | undefined>
}

export function useBlockNew(by: OutlineBy, place: BlocksPlace): BlockNew {
  const { farmId, language, reader, blocks, farm } = place
  const { render, problem } = useMessages()
  const work = useBlockWork({
    farmId, by, language: () => language.value, others: () => blocks.value, farmPlace: () => farm.value?.place ?? null,
  })
  const saving = useBlockSave()
  const { content } = work.draft
  const { outline } = work
  const sentencesOf = (caution: Caution): string[] =>
    caution.sentences.map((each) => (typeof each === 'string' ? each : render(each)))
  const wordsOf = (error: FieldError): string => ('words' in error ? error.words : translate(language.value, error.id))

  const impossible = computed(() => outline.findings.value.map((finding) => outlineWords(language.value, finding)))
  watch([outline.geometry, outline.findings, () => content.value.by, () => content.value.shape.open === null], () => { saving.forget() })

  const points = computed(() => countPoints(content.value.shape))
  const figures = computed(() => {
    const measure = outline.measure.value
    return {
      area: measure === null ? '' : areaWords(reader.value, measure.areaM2),
      perimeter: measure === null ? '' : lengthWords(reader.value, measure.perimeterM),
      points: formatNumber(points.value, { digits: 0 }, language.value),
    }
  })

  /** Why the outline cannot be saved as it stands; null where it can. */
  function faultOf(): FieldError | null {
    const { by: how, shape } = content.value
    const said = [...(how === 'points' ? work.typed.errors.value : []), ...impossible.value]
    if (said.length > 0) return { words: said.join('\n') }
    if (points.value > 0 && points.value < 3) return { id: 'blocks.geometry.few' }
    return outline.geometry.value === null || shape.open !== null ? { id: 'blocks.form.outlineNeeded' } : null
  }

  function finish(): void {
    if (outline.finish()) return
    const words = impossible.value.join('\n')
    saving.errors.value = { geometry: words === '' ? { id: 'blocks.geometry.few' } : { words } }
  }

  async function save(): ReturnType<BlockNew['save']> {
    if (saving.saving.value) return undefined
    const geometry = outline.geometry.value
    const fault = faultOf()
    if (fault !== null) saving.errors.value = { geometry: fault }
    if (fault !== null || geometry === null) return undefined
    const { code } = content.value
    const { area } = figures.value
    const outcome = await saving.save({
      farmId: farmId.value, id: work.draft.id.value, content: content.value, geometry,
      cautions: work.cautions.value, takenCodes: blocks.value.map((block) => block.code),
    })
    if (outcome === undefined) return undefined
    await work.draft.discard()
    return { code, area, outcome }
  }

  return {
    work, saving, figures, impossible, save, finish,
    facts: computed(() => (['area', 'perimeter', 'corners'] as const).map((name) => ({
      term: translate(language.value, `blocks.while.${name}`), figure: figures.value[name === 'corners' ? 'points' : name],
    }))),
    banner: computed(() => bannerText(language.value, figures.value, points.value)),
    unlikely: computed(() => work.cautions.value.flatMap(sentencesOf)),
    asked: computed(() => saving.asked.value.map((caution) => ({ code: caution.code, sentences: sentencesOf(caution) }))),
    errors: computed(() => Object.fromEntries(Object.entries(saving.errors.value).map(([path, error]) => [path, wordsOf(error)]))),
    refusal: computed(() => (saving.error.value === null ? '' : problem(saving.error.value))),
  }
}

function bannerText(language: 'en' | 'es', { area, perimeter, points }: { area: string; perimeter: string; points: string }, count: number): string {
  if (count === 0) return translate(language, 'blocks.draw.none')
  if (count < 3) return translate(language, 'blocks.draw.corner', { points })
  if (area === '') return translate(language, 'blocks.draw.pointsOnly', { points })
  return renderMessage(language, { id: 'blocks.draw.figures', params: { area, perimeter, points } })
}
