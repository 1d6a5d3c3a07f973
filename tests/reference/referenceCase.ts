/**
 * A published value that `calc` can compute. `fn` and `args` are one line of `calc`; `read` takes the figure out of its answer.
 * `source` names where the value was read; COMPUTED is arithmetic from the stated formula, FROM MEMORY was not read again.
 */
export interface ReferenceCase {
  id: string
  source: string
  fn: string
  args: Record<string, unknown>
  read: (answer: never) => number
  expected: number
  /** Absolute, in the unit of `expected`. */
  tolerance: number
}

/** The same case with its first number made larger, by so much that no answer may still be right. */
export function altered({ args, expected, tolerance }: ReferenceCase): Record<string, unknown> {
  const factor = 1.01 + (3 * tolerance) / Math.abs(expected)
  let isDone = false
  const walk = (value: unknown): unknown => {
    if (typeof value === 'number' && !isDone) {
      isDone = true
      return value * factor
    }
    if (typeof value !== 'object' || value === null) return value
    return Object.fromEntries(Object.entries(value).map(([key, member]) => [key, walk(member)]))
  }
  return walk(args) as Record<string, unknown>
}
