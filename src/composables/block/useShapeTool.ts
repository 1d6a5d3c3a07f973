import { computed, ref, watch, type ComputedRef, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import { snapToNeighbours } from '../../../shared/geo/snapToNeighbours.ts'
import type { MapMode } from '../map/mapTypes.ts'
import type { ShapeTool } from './blockTools.ts'
import type { BlockReshape } from './useBlockReshape.ts'
import type { BlocksPlace } from './useBlocksPlace.ts'

/** The tool in hand on the page that changes an outline. */
export interface ShapeToolWork {
  mode: ComputedRef<MapMode>
  /** Closes the ring being set; says what is wrong where it cannot stand. */
  finish: () => void
  as: (as: 'part' | 'hole') => void
  snap: (reachM: string) => void
  snapWords: Ref<string>
  /** Why the ring was not closed. */
  fault: Ref<string>
}

const LEAST_REACH_M = 0.1
const MOST_REACH_M = 20

/** Begins and leaves what each tool needs. @param setTool another tool is taken up. */
export function useShapeTool(tool: () => ShapeTool, setTool: (tool: ShapeTool) => void, { draft, work, impossible, beginTyping, block }: BlockReshape, { blocks }: BlocksPlace): ShapeToolWork {
  const { t } = useI18n()
  const snapWords = ref('')
  const fault = ref('')
  const shape = () => draft.content.value.shape

  watch([tool, draft.ready], ([now, isReady]) => {
    if (!isReady) return
    fault.value = ''
    if (now === 'hole' && shape().open === null) work.open('hole')
    if (now !== 'hole' && shape().open !== null) work.leave()
    if (now === 'points') beginTyping()
  }, { immediate: true })

  function finish(): void {
    const few = (shape().open?.points.length ?? 0) < 3
    if (work.finish()) setTool('reshape')
    else fault.value = few ? t('shapes.hole.few') : (impossible.value[0] ?? t('shapes.reshape.impossible'))
  }

  function snap(words: string): void {
    const reachM = Number(words.replace(',', '.'))
    const geometry = work.geometry.value
    if (!(reachM >= LEAST_REACH_M && reachM <= MOST_REACH_M)) {
      snapWords.value = t('shapes.snap.reachWrong')
      return
    }
    if (geometry === null) return
    const others = blocks.value.filter(({ id }) => id !== block.value?.id).map((other) => other.geometry)
    const snapped = snapToNeighbours(geometry, others, reachM)
    if (snapped.geometry !== null && snapped.changed > 0) work.replace(snapped.geometry)
    snapWords.value = snapped.geometry === null ? t('shapes.snap.failed') : snapped.changed === 0 ? t('shapes.snap.none') : t('shapes.snap.done', snapped.changed, { named: { count: snapped.changed } })
  }

  return {
    snapWords, fault, finish, snap,
    as: (as) => {
      work.leave()
      work.open(as)
    },
    mode: computed(() => (shape().open !== null ? 'draw' : tool() === 'points' ? 'look' : 'edit')),
  }
}
