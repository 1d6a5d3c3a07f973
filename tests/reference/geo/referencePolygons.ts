import { readFileSync } from 'node:fs'
import { z } from 'zod'
import { boundarySchema } from '../../../shared/contract/block.ts'

const setSchema = z.object({
  features: z.array(
    z.object({
      id: z.string(),
      properties: z.object({ desc: z.string(), area_m2: z.number(), perimeter_m: z.number() }),
      geometry: boundarySchema,
    }),
  ),
})

/** R01 to R20. @source GeographicLib Planimeter 2.1.2, WGS84, geodesic edges, on the coordinates of the file. */
export const REFERENCE_POLYGONS = setSchema
  .parse(JSON.parse(readFileSync(new URL('../area-reference.geojson', import.meta.url), 'utf8')))
  .features.map(({ id, properties, geometry }) => ({
    id,
    what: properties.desc,
    areaM2: properties.area_m2,
    perimeterM: properties.perimeter_m,
    geometry,
  }))
