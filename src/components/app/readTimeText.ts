/** A time of day as typed → `HH:MM`; empty stays empty; null when it is no time: 7:35, 7.35, 735, 0735, 7. */
export function readTimeText(text: string): string | null {
  const typed = text.trim()
  if (typed === '') return ''
  const read = /^(\d{1,2})(?:[:.h](\d{2}))?$/.exec(typed) ?? /^(\d{1,2})(\d{2})$/.exec(typed)
  if (read === null) return null
  const [hours, minutes] = [Number(read[1]), Number(read[2] ?? '0')]
  if (hours > 23 || minutes > 59) return null
  return `${String(hours).padStart(2, '0')}:${String(minutes).padStart(2, '0')}`
}
