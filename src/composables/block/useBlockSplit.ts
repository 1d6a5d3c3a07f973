import { computed, ref, watch, type ComputedRef, type Ref, type WritableComputedRef } from 'vue'
import { useI18n } from 'vue-i18n'
import type { BlocksChanged } from '../../../shared/contract/blockChanges.ts'
import { lineText } from '../../../shared/contract/text.ts'
import { distanceKm } from '../../../shared/geo/distanceKm.ts'
import type { Boundary, Position } from '../../../shared/geo/geometryTypes.ts'
import { lineAtShare } from '../../../shared/geo/lineAtShare.ts'
import { measurePolygon } from '../../../shared/geo/measurePolygon.ts'
import { splitBoundary } from '../../../shared/geo/splitBoundary.ts'
import { uniteBoundaries } from '../../../shared/geo/uniteBoundaries.ts'
import { formatNumber } from '../../../shared/units/formatQuantity.ts'
import type { Submitted } from '../../stores/outbox.ts'
import { areaWords, type BlockWords } from './blockWords.ts'
import { newId } from '../form/newId.ts'
import { outlineWords } from './outlineWords.ts'
import { cornersOfShape, shapeOf, type ShapeCorner } from './shape.ts'
import { useAsked, type Asked } from './useAsked.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'
import { useKeptForm, type KeptForm } from '../form/useKeptForm.ts'
import { useMessages } from '../app/useMessages.ts'
import { useSubmit } from '../form/useSubmit.ts'
import { useTask } from '../form/useTask.ts'

/** How the line of a cut is given. */
export type SplitBy = 'line' | 'corners' | 'share'
/** A piece and the block it becomes; pieces of one code become one block. */
export interface SplitPiece { geometry: Boundary; code: string; name: string; words: string }

/** A cut in the making: what the device keeps. */
export interface SplitContent {
  by: SplitBy
  /** Points of the drawn line. */
  drawn: Position[]
  /** Numbers from 0 among the block's corners; the longest edge while none is chosen. */
  from: string
  to: string
  edge: string | null
  /** Percent, as typed. */
  share: string
  names: { code?: string; name?: string }[]
}

/** The page that cuts a block. */
export interface BlockSplit {
  kept: KeptForm<SplitContent>
  block: ComputedRef<BlockWords | null>
  by: WritableComputedRef<SplitBy>
  drawn: WritableComputedRef<Position[]>
  from: WritableComputedRef<string>
  to: WritableComputedRef<string>
  edge: WritableComputedRef<string>
  share: WritableComputedRef<string>
  corners: ComputedRef<readonly ShapeCorner[]>
  line: ComputedRef<readonly Position[]>
  pieces: ComputedRef<readonly SplitPiece[]>
  rename: (index: number, words: { code?: string; name?: string }) => void
  /** Why there are no pieces, or why they cannot be saved. */
  fault: ComputedRef<string>
  errors: Asked['errors']
  saving: Ref<boolean>
  save: () => Promise<Submitted<BlocksChanged> | undefined>
}

const CODE_LENGTH = 12
const NOTHING: SplitContent = { by: 'line', drawn: [], from: '0', to: '2', edge: null, share: '50', names: [] }
const LETTERS = 'abcdefghijklmnopqrstuvwxyz'

export function useBlockSplit(id: () => string, place: BlocksPlace): BlockSplit {
  const { blocks, farmId, language, reader } = place
  const { t } = useI18n()
  const { problem } = useMessages()
  const { submit } = useSubmit()
  const { errors, takeRefusal } = useAsked()
  const block = computed(() => blocks.value.find((each) => each.id === id()) ?? null)
  const kept = useKeptForm<SplitContent>(NOTHING, {
    farmId, kind: 'split', about: () => block.value?.id ?? null, fresh: () => (block.value === null ? null : NOTHING), isBegun: (content) => JSON.stringify(content) !== JSON.stringify(NOTHING),
  })
  const part = <Key extends keyof SplitContent>(key: Key): WritableComputedRef<SplitContent[Key]> => computed({
    get: () => kept.content.value[key], set: (value) => { kept.content.value = { ...kept.content.value, [key]: value } },
  })
  const [by, drawn, from, to, share, names] = [part('by'), part('drawn'), part('from'), part('to'), part('share'), part('names')]
  const ids = new Map<string, string>()
  const tried = ref('')

  const corners = computed(() => (block.value === null ? [] : cornersOfShape(shapeOf(block.value.geometry))))
  const edge = computed({ get: () => kept.content.value.edge ?? longestEdge(corners.value), set: (value) => { kept.content.value = { ...kept.content.value, edge: value } } })
  const line = computed<readonly Position[]>(() => {
    if (by.value === 'line') return drawn.value
    if (by.value === 'corners') return [from.value, to.value].flatMap((number) => {
      const corner = corners.value[Number(number)]
      return corner ? [corner.position] : []
    })
    return lineOfShare(block.value, corners.value[Number(edge.value)], Number(share.value.replace(',', '.')))
  })
  const cut = computed(() => (block.value === null || line.value.length < 2 ? { pieces: [], findings: [] } : splitBoundary(block.value.geometry, line.value)))
  watch(line, () => {
    errors.value = {}
    tried.value = ''
  })

  const pieces = computed(() => cut.value.pieces.map((geometry, index): SplitPiece => {
    const { areaM2 } = measurePolygon(geometry)
    const of = block.value
    const percent = formatNumber((areaM2 / (of?.areaM2 ?? areaM2)) * 100, { digits: 1 }, language.value)
    return {
      geometry, code: names.value[index]?.code ?? `${(of?.code ?? '').slice(0, CODE_LENGTH - 1)}${LETTERS[index % LETTERS.length] ?? ''}`, name: names.value[index]?.name ?? of?.name ?? '',
      words: t('shapes.split.pieceWords', { area: areaWords(reader.value, areaM2), percent }),
    }
  }))

  const task = useTask(async (of: BlockWords, parts: { code: string; name: string; geometry: Boundary }[]): Promise<Submitted<BlocksChanged> | undefined> => {
    const withIds = parts.map(({ geometry, ...part }) => ({ ...part, id: idOf(part.code), geometry: { ...geometry } }))
    try {
      const cutUp = await submit({ kind: 'block.split', farmId: farmId.value, id: of.id, body: { revision: of.revision, parts: withIds } })
      await kept.discard()
      return cutUp
    } catch (error) {
      if (!takeRefusal(error)) throw error
      return undefined
    }
  })
  /** The same id for the same code, so that sending twice cuts once. */
  function idOf(code: string): string {
    const made = ids.get(code) ?? newId()
    ids.set(code, made)
    return made
  }

  async function save(): Promise<Submitted<BlocksChanged> | undefined> {
    const parts = joinByCode(pieces.value)
    errors.value = Object.fromEntries(pieces.value.flatMap(({ code, name }, index) => [
      ...(lineText(CODE_LENGTH).safeParse(code).success ? [] : [[`parts.${index}.code`, { id: 'problems.text.required' }] as const]),
      ...(lineText(80).safeParse(name).success ? [] : [[`parts.${index}.name`, { id: 'problems.text.required' }] as const]),
    ]))
    tried.value = pieces.value.length > 0 && parts.length < 2 ? t('shapes.split.twoNeeded') : ''
    if (block.value === null || parts.length < 2 || Object.keys(errors.value).length > 0 || task.running.value) return undefined
    return task.run(block.value, parts)
  }

  return {
    kept, block, by, drawn, from, to, edge, share, corners, line, pieces, errors, save,
    saving: task.running,
    rename: (index, words) => { names.value = pieces.value.map((piece, each) => ({ code: piece.code, name: piece.name, ...(each === index ? words : {}) })) },
    fault: computed(() => {
      const finding = cut.value.findings[0]
      if (finding !== undefined) return outlineWords(language.value, finding)
      if (by.value === 'share' && line.value.length === 0) return t('shapes.split.shareWrong')
      const refused = Object.entries(errors.value).find(([path]) => !path.endsWith('.code') && !path.endsWith('.name'))?.[1]
      if (refused !== undefined) return 'words' in refused ? refused.words : t(refused.id)
      return tried.value !== '' ? tried.value : task.error.value === null ? '' : problem(task.error.value)
    }),
  }
}

/** The number of the edge that rows run along. */
function longestEdge(corners: readonly ShapeCorner[]): string {
  const lengths = corners.map(({ position, next }) => distanceKm(position, next))
  return String(Math.max(0, lengths.indexOf(Math.max(...lengths))))
}

function lineOfShare(block: BlockWords | null, corner: ShapeCorner | undefined, percent: number): Position[] {
  if (block === null || corner === undefined || !(percent >= 1 && percent <= 99)) return []
  return lineAtShare(block.geometry, corner.at, percent / 100)
}

/** One block a code; pieces that touch are joined again. */
function joinByCode(pieces: readonly SplitPiece[]): { code: string; name: string; geometry: Boundary }[] {
  const codes = [...new Set(pieces.map(({ code }) => code.trim()))]
  return codes.flatMap((code) => {
    const own = pieces.filter((piece) => piece.code.trim() === code)
    const geometry = own.length === 1 ? own[0]?.geometry : uniteBoundaries(own.map((piece) => piece.geometry)).geometry
    return geometry === undefined || geometry === null ? [] : [{ code, name: own[0]?.name ?? '', geometry }]
  })
}
