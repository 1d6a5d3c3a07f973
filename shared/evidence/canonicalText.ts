import canonicalize from 'canonicalize'

/** Deeper than anything that is signed; reading and hashing it never runs out of stack. */
const MAX_DEPTH = 100

/**
 * The one text of a JSON value, which is signed and hashed: keys sorted by UTF-16 units, numbers as ECMAScript writes them, no
 * spaces. Only what JSON can hold goes in, so that the text read back is the value.
 * @throws {RangeError} naming the place, for NaN, an infinity, undefined, a function, a symbol, a bigint, a lone surrogate, an
 * object that is not plain (a Date, a Map), a circle, more than 100 lists and objects inside each other.
 * @source RFC 8785 (JSON Canonicalization Scheme).
 */
export function canonicalText(value: unknown): string {
  assertJson(value, '$', new Set())
  const text = canonicalize(value)
  if (text === undefined) throw new RangeError('$ has no canonical text')
  return text
}

function assertJson(value: unknown, path: string, above: Set<object>): void {
  if (value === null || typeof value === 'boolean') return
  if (typeof value === 'string') return assertText(value, path)
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new RangeError(`${path} is ${value}`)
    return
  }
  if (typeof value !== 'object') throw new RangeError(`${path} is ${typeof value}`)
  if (above.has(value)) throw new RangeError(`${path} is a circle`)
  if (above.size >= MAX_DEPTH) throw new RangeError(`${path.slice(0, 80)}… lies more than ${MAX_DEPTH} levels deep`)
  above.add(value)
  if (Array.isArray(value)) assertItems(value, path, above)
  else assertMembers(value, path, above)
  above.delete(value)
}

function assertItems(items: readonly unknown[], path: string, above: Set<object>): void {
  for (let index = 0; index < items.length; index += 1) assertJson(items[index], `${path}[${index}]`, above)
}

function assertMembers(value: object, path: string, above: Set<object>): void {
  const prototype: unknown = Object.getPrototypeOf(value)
  if (prototype !== Object.prototype && prototype !== null) throw new RangeError(`${path} is no plain object`)
  if (Object.getOwnPropertySymbols(value).length > 0) throw new RangeError(`${path} has a symbol key`)
  for (const [key, member] of Object.entries(value)) {
    assertText(key, `a key of ${path}`)
    assertJson(member, `${path}.${key.slice(0, 40)}`, above)
  }
}

function assertText(text: string, path: string): void {
  // With the u flag a surrogate class matches only lone ones.
  if (/\p{Surrogate}/u.test(text)) throw new RangeError(`${path} holds a lone surrogate`)
}
