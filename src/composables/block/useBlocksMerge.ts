import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { BlocksChanged } from '../../../shared/contract/blockChanges.ts'
import { lineText } from '../../../shared/contract/text.ts'
import type { Boundary } from '../../../shared/geo/geometryTypes.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { totalAreaM2 } from '../../../shared/geo/totalAreaM2.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import type { Submitted } from '../../stores/outbox.ts'
import type { Caution } from './blockCautions.ts'
import { areaWords, type BlockWords } from './blockWords.ts'
import { newId } from '../form/newId.ts'
import { outlineWords } from './outlineWords.ts'
import { useAsked, type Asked } from './useAsked.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useKeptForm, type KeptForm } from '../form/useKeptForm.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** A join in the making: what the device keeps. */
export interface MergeContent {
  /** The id the block will have, so that sending twice makes one. */
  id: string
  ids: readonly string[]
  code?: string
  name?: string
}

/** The page that makes one block of several. */
export interface BlocksMerge {
  kept: KeptForm<MergeContent>
  chosen: ComputedRef<readonly BlockWords[]>
  isChosen: (id: string) => boolean
  toggle: (id: string) => void
  code: Ref<string>
  name: Ref<string>
  united: ComputedRef<Boundary | null>
  /** "3 blocks, 2.97 ha". */
  summary: ComputedRef<string>
  asked: Asked
  fault: ComputedRef<string>
  saving: Ref<boolean>
  save: () => Promise<Submitted<BlocksChanged> | undefined>
}

/** @param first the block the page was opened for; null for none. */
export function useBlocksMerge(first: string | null, { blocks, farmId, language, reader }: BlocksPlace): BlocksMerge {
  const { t } = useI18n()
  const { problem } = useMessages()
  const { submit } = useSubmit()
  const asked = useAsked()
  const nothing: MergeContent = { id: newId(), ids: first === null ? [] : [first] }
  const kept = useKeptForm<MergeContent>(nothing, {
    farmId, kind: 'merge', about: () => farmId.value, fresh: () => nothing,
    isBegun: ({ ids: all, code: typedCode, name: typedName }) => all.some((one) => one !== first) || typedCode !== undefined || typedName !== undefined,
  })
  const { content } = kept
  watch(kept.ready, () => {
    // A join begun earlier takes in the block that the page was opened for.
    if (first !== null && !content.value.ids.includes(first)) content.value = { ...content.value, ids: [...content.value.ids, first] }
  })
  const ids = computed(() => content.value.ids)
  const chosen = computed(() => ids.value.flatMap((id) => blocks.value.find((block) => block.id === id) ?? []))
  const tried = ref('')
  const result = computed(() => (chosen.value.length < 2 ? null : uniteBoundaries(chosen.value.map(({ geometry }) => geometry))))
  const cautions = computed<Caution[]>(() => (result.value?.isApart === true ? [{ code: 'geometry.apart', sentences: [t('shapes.merge.apart')] }] : []))
  watch(ids, () => {
    asked.forget()
    tried.value = ''
  })

  const code = computed({ get: () => content.value.code ?? chosen.value[0]?.code ?? '', set: (words) => { content.value = { ...content.value, code: words } } })
  const name = computed({ get: () => content.value.name ?? chosen.value[0]?.name ?? '', set: (words) => { content.value = { ...content.value, name: words } } })

  const task = useTask(async (): Promise<Submitted<BlocksChanged> | undefined> => {
    if (!asked.hasReasons(cautions.value)) return undefined
    const { id } = content.value
    try {
      const joined = await submit({
        kind: 'block.merge', farmId: farmId.value, id,
        body: { blocks: chosen.value.map((block) => ({ id: block.id, revision: block.revision })), block: { id, code: code.value, name: name.value }, acknowledged: asked.acknowledged() },
      })
      await kept.discard()
      return joined
    } catch (error) {
      if (!asked.takeRefusal(error)) throw error
      return undefined
    }
  })

  async function save(): Promise<Submitted<BlocksChanged> | undefined> {
    tried.value = chosen.value.length < 2 ? t('shapes.merge.twoNeeded') : ''
    if (chosen.value.length < 2 || result.value?.geometry === null || task.running.value) return undefined
    const isBad = { 'block.code': !lineText(12).safeParse(code.value).success, 'block.name': !lineText(80).safeParse(name.value).success }
    const bad = Object.entries(isBad).filter(([, bad]) => bad).map(([path]) => path)
    if (bad.length > 0) {
      asked.errors.value = Object.fromEntries(bad.map((path) => [path, { id: 'problems.text.required' }]))
      return undefined
    }
    return task.run()
  }

  return {
    kept, chosen, code, name, asked, save,
    isChosen: (one) => ids.value.includes(one),
    toggle: (one) => { content.value = { ...content.value, ids: ids.value.includes(one) ? ids.value.filter((each) => each !== one) : [...ids.value, one] } },
    united: computed(() => result.value?.geometry ?? null),
    summary: computed(() => {
      const areaM2 = result.value?.geometry ? measurePolygon(result.value.geometry).areaM2 : totalAreaM2(chosen.value)
      return t('shapes.merge.chosen', { count: chosen.value.length, area: areaWords(reader.value, areaM2) }, chosen.value.length)
    }),
    fault: computed(() => {
      const finding = result.value?.findings[0]
      if (finding !== undefined) return outlineWords(language.value, finding)
      const refused = Object.entries(asked.errors.value).find(([path]) => path.startsWith('blocks'))?.[1]
      if (refused !== undefined) return 'words' in refused ? refused.words : t(refused.id)
      return tried.value !== '' ? tried.value : task.error.value === null ? '' : problem(task.error.value)
    }),
    saving: task.running,
  }
}
