import { z } from 'zod'

/** A parser as JSON Schema (2020-12): what it takes, or what it gives. */
export function schemaOf(schema: z.ZodType, io: 'input' | 'output'): object {
  const { $schema: _dialect, ...shape } = z.toJSONSchema(schema, { io, unrepresentable: 'any' })
  return shape
}
