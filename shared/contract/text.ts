import { z } from 'zod'

const CONTROL = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F]/
const BIDI = /[\u202A-\u202E\u2066-\u2069]/
const BLANK = /^[\s\u200B-\u200D\u2060\uFEFF]*$/
const BREAKS = /[\r\n\u2028\u2029]/

/**
 * Words a person typed: normalised to NFC and trimmed, never empty, without control or direction marks.
 * @param max longest accepted length in UTF-16 units.
 */
function words(max: number) {
  return z
    .string()
    .normalize('NFC')
    .trim()
    .max(max, { error: 'text.too_long' })
    .refine((text) => !BLANK.test(text), { error: 'text.required' })
    .refine((text) => !CONTROL.test(text) && text.isWellFormed(), { error: 'text.control' })
    .refine((text) => !BIDI.test(text), { error: 'text.bidi_control' })
}

/** One line of words: a name, a code, a source. */
export const lineText = (max: number) =>
  words(max).refine((text) => !BREAKS.test(text), { error: 'text.line_break' })

/** Words that may run over several lines: a note, a reason. */
export const noteText = (max: number) => words(max)
