import type { z } from 'zod'
import { pageOf } from '../../shared/contract/common.ts'
import { http } from './http.ts'

/** Every item of a list, page by page; for the short lists of a farm, not for its records. */
export async function allPages<Item extends z.ZodType>(
  path: string, item: Item, query: Record<string, string | undefined> = {},
): Promise<z.output<Item>[]> {
  const items: z.output<Item>[] = []
  let cursor: string | undefined
  do {
    const page = await http.get(path, pageOf(item), { ...query, limit: 200, cursor })
    items.push(...page.items)
    cursor = page.next ?? undefined
  } while (cursor !== undefined)
  return items
}
