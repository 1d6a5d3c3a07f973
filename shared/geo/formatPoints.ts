import type { Position } from './geometryTypes.ts'

/** Points as `parsePoints` reads them: one a line, latitude first, decimal degrees with 7 decimals. */
export function formatPoints(points: readonly Position[]): string {
  return points.map(([lon, lat]) => `${lat.toFixed(7)}, ${lon.toFixed(7)}`).join('\n')
}
