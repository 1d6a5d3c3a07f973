const MOST_LABEL = 120
/** Nothing that shows: controls, direction and format marks, unpaired surrogates, code points without a character. */
const UNSEEN = /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Cn}\u2028\u2029]/gu
/** Joins letters of some scripts and parts of one picture character; it is kept inside a name. */
const JOINERS = /[\u200C\u200D]/
const ENDING = /\.[A-Za-z0-9]{1,8}$/

/**
 * The label of a file out of its name: no folders, nothing that does not show, one line, at most 120 UTF-16 units, its ending kept.
 * @param whenBlank what it is called when nothing readable is left.
 */
export function fileLabel(name: string, whenBlank: string): string {
  const base = name.normalize('NFC').split(/[/\\]/).at(-1) ?? ''
  const seen = base.replace(UNSEEN, (mark) => (JOINERS.test(mark) ? mark : ' ')).replace(/\s+/g, ' ').trim()
  const bare = seen.replace(ENDING, '').replace(/[\s.\u200C\u200D]/g, '')
  return bare === '' ? whenBlank : shorten(seen)
}

function shorten(label: string): string {
  if (label.length <= MOST_LABEL) return label
  const ending = ENDING.exec(label)?.[0] ?? ''
  const room = MOST_LABEL - ending.length - 1
  let kept = ''
  for (const { segment } of new Intl.Segmenter('en').segment(label)) {
    if (kept.length + segment.length > room) break
    kept += segment
  }
  return `${kept.trimEnd()}…${ending}`
}
