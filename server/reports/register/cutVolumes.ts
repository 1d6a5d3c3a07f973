/** Pages of a volume at most, so that no machine has to hold more. */
const MOST_PAGES = 150
/** What rows have of a page at least, and of a volume's first one under its title, points. */
const ROOM = { first: 150, later: 440 }

/** Where volumes are cut: fed with the heights of the rows in their order, says before which row a new volume begins. */
export interface VolumeCutter {
  /** @param height at least that of the row, points. @returns whether the row begins a volume; the first one always does. */
  take(height: number): boolean
}

/**
 * Sets rows page by page as the drawing does. Rows that turn out lower than said only end a page later, so that a volume never
 * has more pages than were counted here.
 */
export function openCutter(mostPages = MOST_PAGES): VolumeCutter {
  let pages = 0
  let room = 0
  return {
    take(height) {
      const begins = pages === 0
      if (begins) {
        pages = 1
        room = ROOM.first
      }
      if (height <= room) {
        room -= height
        return begins
      }
      if (pages === mostPages) {
        pages = 1
        room = ROOM.first - height
        return true
      }
      pages += 1
      room = ROOM.later - height
      return begins
    },
  }
}
