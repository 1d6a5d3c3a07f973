import { bbox } from '@turf/turf'
import type { Message } from '../contract/common.ts'
import { distanceKm } from '../geo/distanceKm.ts'
import { findOverlaps, type NamedBoundary } from '../geo/findOverlaps.ts'
import type { Position } from '../geo/geometryTypes.ts'
import { FAR_KM } from '../geo/isFarFrom.ts'
import { looksSwapped } from '../geo/looksSwapped.ts'
import { middleOf } from '../geo/middleOf.ts'
import type { Candidate } from './importTypes.ts'
import { M2_PER_HA } from '../units/hectare.ts'

/** A block with its box, so that distant ones are passed over at a glance. */
export interface Placed extends NamedBoundary {
  name: string
  /** West, south, east, north in degrees. */
  box: number[]
  middle: Position
}

export const placed = (block: NamedBoundary & { name: string }): Placed => ({ ...block, box: bbox(block.geometry), middle: middleOf(block.geometry) })

/** Shared ground under this part of the smaller one is the width of a pen. */
const OVERLAP_SHARE = 0.05
/** From this share on, either way, two outlines are one block drawn twice. */
const SAME_SHARE = 0.95

/**
 * What is unlikely about a shape beside the blocks of the farm and the shapes before it, and which of them it seems to be once more.
 * @param place a point of the farm [lon, lat], used where it has no block yet.
 */
export function findDoubts(shape: Placed, blocks: readonly Placed[], before: readonly Placed[], place: Position | null): Pick<Candidate, 'cautions' | 'twin'> {
  const near = [...blocks, ...before].filter(({ box }) => doBoxesMeet(box, shape.box))
  const { overlaps, tooFine } = findOverlaps(shape.geometry, near)
  const shared = overlaps.filter(({ share }) => share > OVERLAP_SHARE)
  const same = overlaps.find(({ share, id }) => share > SAME_SHARE && isAlike(shape, near.find((other) => other.id === id)))
  return {
    cautions: [
      ...shared.map(({ code, areaM2 }) => caution('overlap', { code, areaHa: Number((areaM2 / M2_PER_HA).toFixed(2)) })),
      ...tooFine.map(({ code }) => caution('overlap_unknown', { code })),
      ...farDoubts(shape, blocks, place),
    ],
    twin: same === undefined ? twinByName(shape, [...blocks, ...before]) : { id: 'importing.twin.ground', params: { code: same.code } },
  }
}

/** The share is of the smaller one: alike are two whose boxes are of one size too. */
function isAlike(shape: Placed, other: Placed | undefined): boolean {
  if (other === undefined) return false
  const size = ([west = 0, south = 0, east = 0, north = 0]: number[]): number => (east - west) * (north - south)
  const [a, b] = [size(shape.box), size(other.box)]
  return Math.min(a, b) > Math.max(a, b) * 0.9
}

const fold = (name: string): string => name.normalize('NFC').trim().toLowerCase()

function twinByName({ name }: Placed, others: readonly Placed[]): Message | null {
  const twin = name === '' ? undefined : others.find((other) => fold(other.name) === fold(name))
  return twin === undefined ? null : { id: 'importing.twin.name', params: { code: twin.code } }
}

function farDoubts({ geometry, middle: own }: Placed, blocks: readonly Placed[], place: Position | null): Candidate['cautions'] {
  const middles = blocks.length > 0 ? blocks.map(({ middle }) => middle) : place === null ? [] : [place]
  const nearest = middles.map((middle) => ({ middle, km: distanceKm(own, middle) })).sort((a, b) => a.km - b.km)[0]
  if (nearest === undefined || nearest.km <= FAR_KM) return []
  return [caution(looksSwapped(geometry, nearest.middle) ? 'swapped' : 'far_from_farm', { km: Math.round(nearest.km) })]
}

function doBoxesMeet(a: readonly number[], b: readonly number[]): boolean {
  const [westA = 0, southA = 0, eastA = 0, northA = 0] = a
  const [westB = 0, southB = 0, eastB = 0, northB = 0] = b
  return westA <= eastB && westB <= eastA && southA <= northB && southB <= northA
}

const caution = (name: string, params: Message['params']): Candidate['cautions'][number] => ({ code: `geometry.${name}`, message: { id: `problems.geometry.${name}`, params } })
