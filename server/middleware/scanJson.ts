const MAX_DEPTH = 64
const SPACE = new Set([' ', '\t', '\n', '\r'])

export type JsonFault = 'json_too_deep' | 'json_duplicate_key'

/**
 * What a parser would pass over in silence: more than 64 lists and objects inside each other, or a key twice in one object.
 * Reads the text once, strings as wholes, keys with their escapes decoded. Text that is no JSON is left for the parser to refuse.
 */
export function scanJson(text: string): JsonFault | null {
  /** Of every open object its keys so far; null for a list. */
  const open: (Set<string> | null)[] = []
  let isKeyNext = false
  for (let at = 0; at < text.length; at += 1) {
    const sign = text.charAt(at)
    if (sign === '{' || sign === '[') {
      if (open.length >= MAX_DEPTH) return 'json_too_deep'
      open.push(sign === '{' ? new Set() : null)
      isKeyNext = sign === '{'
    } else if (sign === '}' || sign === ']') {
      open.pop()
      isKeyNext = false
    } else if (sign === ',') {
      isKeyNext = open.at(-1) instanceof Set
    } else if (sign === '"') {
      const end = findEnd(text, at)
      if (end === -1) return null
      const keys = isKeyNext ? open.at(-1) : null
      const key = keys ? decode(text.slice(at, end + 1)) : null
      if (keys && key !== null) {
        if (keys.has(key)) return 'json_duplicate_key'
        keys.add(key)
      }
      isKeyNext = false
      at = end
    } else if (!SPACE.has(sign)) {
      isKeyNext = false
    }
  }
  return null
}

/** Where the string that begins at `start` ends; -1 where it does not. */
function findEnd(text: string, start: number): number {
  for (let at = start + 1; at < text.length; at += 1) {
    const sign = text.charAt(at)
    if (sign === '\\') at += 1
    else if (sign === '"') return at
  }
  return -1
}

/** A key without its escapes; null where it is no JSON string. */
function decode(quoted: string): string | null {
  if (!quoted.includes('\\')) return quoted.slice(1, -1)
  try {
    return String(JSON.parse(quoted))
  } catch {
    // A bad escape: the parser refuses the whole text.
    return null
  }
}
