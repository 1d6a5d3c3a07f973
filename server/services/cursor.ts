import { z } from 'zod'
import { invalid } from '../errors.ts'

/** Where a list goes on: the sort key and id of the last row shown, and which list it was where one address has several. */
export function encodeCursor(...place: readonly string[]): string {
  return Buffer.from(JSON.stringify(place)).toString('base64url')
}

/**
 * Where a list goes on from. @param keySchema what the sort key of this list can be: anybody can write a cursor.
 * @param list which list it must have come from, where one address has several.
 * @returns null at the start of the list. @throws {AppError} if the text is no cursor of ours.
 */
export function decodeCursor(text: string | undefined, keySchema: z.ZodType<string>, list?: string): { key: string; id: string } | null {
  if (text === undefined) return null
  try {
    const place = z.tuple(list === undefined ? [keySchema, z.guid()] : [keySchema, z.guid(), z.literal(list)])
    const [key, id] = place.parse(JSON.parse(Buffer.from(text, 'base64url').toString('utf8')))
    return { key, id }
  } catch {
    throw invalid([{ path: 'cursor', code: 'cursor.invalid' }])
  }
}

/** Cuts the row that was read beyond the page, and says where the next page begins. */
export function cutPage<Row, Item>(
  rows: Row[],
  limit: number,
  present: (row: Row) => Item,
  keyOf: (row: Row) => [key: string, id: string, list?: string],
): { items: Item[]; next: string | null } {
  const shown = rows.slice(0, limit)
  const last = shown.at(-1)
  return {
    items: shown.map(present),
    next: rows.length > limit && last !== undefined ? encodeCursor(...keyOf(last).filter((part) => part !== undefined)) : null,
  }
}
