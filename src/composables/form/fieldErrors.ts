import { ApiError } from '../../api/errors.ts'

/**
 * The words of a refusal field by field: path of the field → sentence. Paths are dotted, `lines.0.blockId`.
 * Empty for anything that is not a refusal of the server.
 */
export function fieldErrors(error: unknown): Record<string, string> {
  if (!(error instanceof ApiError)) return {}
  return Object.fromEntries(error.problem.errors.map((each) => [each.path, each.message]))
}
