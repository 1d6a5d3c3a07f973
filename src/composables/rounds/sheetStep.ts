import type { SheetPlace } from './useJobDrag.ts'

const WEEK = 7
const PAGE_ROWS = 8

/** Where a key takes the cell cursor; null for a key that means nothing here. Page keys go by weeks and rows, T to today. */
export function sheetStep({ row, day }: SheetPlace, { key, shiftKey }: Pick<KeyboardEvent, 'key' | 'shiftKey'>, { rows, days, today }: { rows: number; days: number; today: number | null }): SheetPlace | null {
  const at = (nextRow: number, nextDay: number): SheetPlace => ({ row: Math.max(0, Math.min(rows - 1, nextRow)), day: Math.max(0, Math.min(days - 1, nextDay)) })
  const step = shiftKey ? WEEK : 1
  switch (key) {
    case 'ArrowLeft':
      return at(row, day - step)
    case 'ArrowRight':
      return at(row, day + step)
    case 'ArrowUp':
      return at(row - 1, day)
    case 'ArrowDown':
      return at(row + 1, day)
    case 'PageUp':
      return at(row - PAGE_ROWS, day)
    case 'PageDown':
      return at(row + PAGE_ROWS, day)
    case 'Home':
      return at(row, 0)
    case 'End':
      return at(row, days - 1)
    default:
      return key.toLowerCase() === 't' && today !== null ? at(row, today) : null
  }
}
