const MOST_CHARACTERS = 200
/** How a shape is to look, not what it is. */
const LOOKS = /^(?:stroke|fill|icon|label-|styleUrl|styleHash|styleMapHash|visibility|@geometry-type|_gpxType|marker-)/

/** What a file says of a shape, as text: words, figures, yes and no, and dates; nested things and looks are left out. */
export function readProperties(found: unknown): Record<string, string> {
  if (typeof found !== 'object' || found === null) return {}
  const pairs = Object.entries(found).flatMap(([column, value]): [string, string][] => {
    const text = LOOKS.test(column) ? '' : textOf(value)
    return text === '' ? [] : [[column, text]]
  })
  return Object.fromEntries(pairs)
}

function textOf(value: unknown): string {
  if (typeof value === 'string') return value.replaceAll('\u0000', '').replace(/[\r\n\u2028\u2029]+/g, ' ').trim().normalize('NFC').slice(0, MOST_CHARACTERS)
  if (typeof value === 'number') return Number.isFinite(value) ? String(value) : ''
  if (typeof value === 'boolean') return String(value)
  if (value instanceof Date) return Number.isFinite(value.getTime()) ? value.toISOString().slice(0, 10) : ''
  return ''
}
