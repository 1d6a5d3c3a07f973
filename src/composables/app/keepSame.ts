/** The map that was there before where the new one says the same, so that what is drawn from it is not drawn again. */
export function keepSame<Value>(before: ReadonlyMap<string, Value> | undefined, now: ReadonlyMap<string, Value>): ReadonlyMap<string, Value> {
  if (before?.size !== now.size) return now
  for (const [key, value] of now) if (JSON.stringify(before.get(key)) !== JSON.stringify(value)) return now
  return before
}
