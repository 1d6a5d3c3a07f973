import { ref, type Ref } from 'vue'
import { useI18n } from 'vue-i18n'
import type { CornerAt } from '../../../shared/geo/boundaryCorners.ts'
import { cornersOfShape, isSameAt, type Shape, type ShapeCorner } from './shape.ts'
import type { ShapeWork } from './useShape.ts'

/** What the keys do to an outline on the map, and what is said of it. */
export interface ShapeKeys {
  said: Ref<string>
  pick: (reachM: number) => void
  /** On to the next corner, or back; the cross goes there. Answers it, so that the map can show it. */
  step: (by: 1 | -1) => ShapeCorner | undefined
  choose: (at: CornerAt) => void
  remove: () => void
  /** The chosen corner moved by metres; without one the whole outline. */
  move: (eastM: number, northM: number) => void
  /** A corner halfway from the chosen one to the next. */
  addAfter: () => void
}

export function useShapeSaid(work: ShapeWork, shape: () => Shape): ShapeKeys {
  const { t } = useI18n()
  const said = ref('')

  function choose(at: CornerAt): void {
    const corners = cornersOfShape(shape())
    const index = corners.findIndex((each) => isSameAt(each.at, at))
    const corner = corners[index]
    if (corner === undefined) return
    work.isHeld.value = false
    work.chosen.value = at
    work.cross.value = corner.position
    said.value = t('shapes.said.corner', { number: index + 1, count: corners.length })
  }

  return {
    said, choose,
    pick: (reachM) => { said.value = t(`shapes.said.${work.pick(reachM)}`) },
    step: (by) => {
      const corners = cornersOfShape(shape())
      const index = corners.findIndex(({ at }) => isSameAt(at, work.chosen.value))
      const next = corners[index === -1 ? (by === 1 ? 0 : corners.length - 1) : (index + by + corners.length) % corners.length]
      if (next !== undefined) choose(next.at)
      return next
    },
    move: (eastM, northM) => {
      if (work.chosen.value === null) work.moveAll(eastM, northM)
      else work.moveBy(work.chosen.value, eastM, northM)
    },
    addAfter: () => {
      const corner = cornersOfShape(shape()).find(({ at }) => isSameAt(at, work.chosen.value))
      if (corner === undefined) return
      const [[lon, lat], [nextLon, nextLat]] = [corner.position, corner.next]
      work.insert(corner.at, [(lon + nextLon) / 2, (lat + nextLat) / 2])
    },
    remove: () => {
      if (work.chosen.value === null) return
      work.remove(work.chosen.value)
      said.value = t('shapes.said.removed')
    },
  }
}
