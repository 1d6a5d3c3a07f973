import type { Position } from '../../../shared/geo/geometryTypes.ts'
import { countPoints, emptyShape, type Shape } from './shape.ts'

/** How the outline is given. */
export type OutlineBy = 'draw' | 'points'

/** A block begun and not yet sent: what the device keeps. */
export interface BlockDraftContent {
  by: OutlineBy
  shape: Shape
  /** The points as typed. */
  typed: string
  code: string
  name: string
  crop: string
}

/** What the device kept before an outline could have holes and parts. */
interface OlderContent extends Partial<Omit<BlockDraftContent, 'shape'>> { points: Position[]; closed: boolean }

/** A draft with nothing in it: its first ring waits for corners. */
export function emptyBlockDraft(by: OutlineBy): BlockDraftContent {
  return { by, shape: begunShape([]), typed: '', code: '', name: '', crop: '' }
}

/** An outline of which only these corners are set. */
export const begunShape = (points: Position[]): Shape => ({ ...emptyShape(), open: { as: 'part', points } })

/** Reads a kept draft, older ones too. */
export function readBlockDraft(kept: Partial<BlockDraftContent> | OlderContent, by: OutlineBy): BlockDraftContent {
  if (!('points' in kept)) return { ...emptyBlockDraft(by), ...kept }
  const { points, closed, ...words } = kept
  return { ...emptyBlockDraft(by), ...words, shape: closed ? { parts: [[points]], open: null } : begunShape(points) }
}

/** Whether anything was done that would be missed. */
export function isBlockDraftBegun({ shape, typed, code, name, crop }: BlockDraftContent): boolean {
  return countPoints(shape) > 0 || [typed, code, name, crop].some((words) => words.trim() !== '')
}
