import { checkPlace } from '../../../shared/geo/checkPlace.ts'
import type { PlaceGeometry } from '../../../shared/geo/geometryTypes.ts'
import { invalid } from '../../errors.ts'

/** A point, line or outline as it is kept. @throws {AppError} invalid-input with everything impossible about it. */
export function readGeometry(geometry: unknown): PlaceGeometry {
  const checked = checkPlace(geometry)
  if (checked.geometry) return checked.geometry
  throw invalid(checked.findings.map(({ code, params, path }) => ({ path: path ? `geometry.${path}` : 'geometry', code, params })))
}
