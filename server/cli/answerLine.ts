import { ZodError } from 'zod'
import { CALC_FUNCTIONS } from './calcFunctions.ts'

/** The answer to one line of `calc`, as one line: `{"value"}`, or `{"error"}` with what was wrong. Never throws. */
export function answerLine(line: string): string {
  try {
    return JSON.stringify({ value: compute(JSON.parse(line)) })
  } catch (error) {
    return JSON.stringify({ error: describe(error) })
  }
}

/** What `calc --help` prints: each function with the shape of its arguments and of its answer. */
export function describeFunctions(): string {
  const lines = Object.entries(CALC_FUNCTIONS).map(([name, { args, answer }]) => `${name} ${args} -> ${answer}\n`)
  return lines.join('')
}

function compute(request: unknown): unknown {
  if (typeof request !== 'object' || request === null || Array.isArray(request)) throw new RangeError('a line is {"fn", "args"}')
  const { fn, args } = request as { fn?: unknown; args?: unknown }
  if (typeof fn !== 'string' || !Object.hasOwn(CALC_FUNCTIONS, fn)) throw new RangeError('fn is not known; see --help')
  return CALC_FUNCTIONS[fn]?.run(args)
}

function describe(error: unknown): string {
  if (error instanceof ZodError) {
    return error.issues.map(({ path, message }) => `${['args', ...path.map(String)].join('.')}: ${message}`).join('; ').slice(0, 500)
  }
  return error instanceof Error ? error.message.slice(0, 500) : 'unknown error'
}
