/** `2026-0143`: the season and the number in it, at least four digits. */
export function formatRecordNumber(season: number, number: number): string {
  return `${season}-${String(number).padStart(4, '0')}`
}
