import { parsePoints, type LineFinding } from '../../../shared/geo/parsePoints.ts'

/** How a line is parted in two: by a semicolon, by blanks between decimal commas, by a comma, by blanks. */
const FORMS = [
  { form: /^([^;]+);([^;]+);?\s*$/, parting: ';' },
  { form: /^\s*([^\s,]+,\d+)\s+([^\s,]+,\d+)\s*$/, parting: ';' },
  { form: /^([^,]+),([^,]+),?\s*$/, parting: ',' },
  { form: /^\s*(\S+)\s+(\S+)\s*$/, parting: ',' },
]

/**
 * Typed points with the two halves of every line exchanged, where that is what is wrong with them.
 * @param findings what was found in the text as typed.
 * @returns the text, or null unless a latitude is out of range and each line that names a place still does once exchanged.
 */
export function swapLines(text: string, findings: readonly LineFinding[]): string | null {
  if (!findings.some(isLatitudeOut)) return null
  const swapped = text.replace(/[^\r\n]+/g, swapLine)
  const others = new Set(findings.filter((finding) => !isLatitudeOut(finding)).map(({ line }) => line))
  return parsePoints(swapped).findings.every(({ line }) => others.has(line)) ? swapped : null
}

export function isLatitudeOut({ code }: LineFinding): boolean {
  return code === 'points.lat_out_of_range'
}

/** Lines whose letters name the axes are read in any order, so they stay. */
function swapLine(line: string): string {
  if (/[a-z]/i.test(line)) return line
  for (const { form, parting } of FORMS) {
    const [, first, second] = form.exec(line) ?? []
    if (first !== undefined && second !== undefined) return `${second.trim()}${parting} ${first.trim()}`
  }
  return line
}
