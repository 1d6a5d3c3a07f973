import type { EntityManager } from 'typeorm'
import type { SignedRecord } from '../../../shared/contract/signedRecord.ts'
import { boundaryParts } from '../../../shared/geo/boundaryParts.ts'
import { cornersOfPlace } from '../../../shared/geo/cornersOfPlace.ts'
import type { PlaceGeometry, Position } from '../../../shared/geo/geometryTypes.ts'
import { firstStart } from '../../../shared/records/registerRow.ts'
import { civilDateIn } from '../../../shared/time/civilDate.ts'
import { GroundFeature } from '../../entities/GroundFeature.ts'
import { Site } from '../../entities/Site.ts'
import type { RecordReportData } from '../../reports/recordReportData.ts'

interface Box { west: number; south: number; east: number; north: number }

/** The ground plan and the sites round a record's blocks that were there on the day of the work, by name. */
export async function readSurroundings(manager: EntityManager, { farm, blocks, content, times }: SignedRecord): Promise<Pick<RecordReportData, 'ground' | 'sites'>> {
  const on = civilDateIn(farm.zone, firstStart(content) ?? times.signedAt)
  const seen = sightOf(blocks.flatMap(({ geometry }) => boundaryParts(geometry).flat(2)))
  const isSeen = ({ endedOn, geometry }: { endedOn: string | null; geometry: PlaceGeometry }): boolean => (endedOn === null || endedOn > on) && meets(seen, boxOf(cornersOfPlace(geometry)))
  const order = { name: 'ASC', id: 'ASC' } as const
  const [ground, sites] = [await manager.find(GroundFeature, { where: { farmId: farm.id }, order }), await manager.find(Site, { where: { farmId: farm.id }, order })]
  return {
    ground: ground.filter(isSeen).map(({ kind, name, geometry, widthM }) => ({ kind, name: name === '' ? null : name, geometry, widthM: widthM === null ? null : Number(widthM) })),
    sites: sites.filter(isSeen).map(({ kind, name, geometry }) => ({ kind, name, geometry })),
  }
}

/** The blocks and as much again on each side: no plan shows more. */
function sightOf(corners: readonly Position[]): Box {
  const { west, south, east, north } = boxOf(corners)
  const reach = Math.max(east - west, north - south)
  return { west: west - reach, south: south - reach, east: east + reach, north: north + reach }
}

function boxOf(corners: readonly Position[]): Box {
  const [lons, lats] = [corners.map(([lon]) => lon), corners.map(([, lat]) => lat)]
  const least = (values: readonly number[]): number => values.reduce((low, value) => Math.min(low, value), Infinity)
  const most = (values: readonly number[]): number => values.reduce((high, value) => Math.max(high, value), -Infinity)
  return { west: least(lons), south: least(lats), east: most(lons), north: most(lats) }
}

const meets = (a: Box, b: Box): boolean => a.west <= b.east && b.west <= a.east && a.south <= b.north && b.south <= a.north
