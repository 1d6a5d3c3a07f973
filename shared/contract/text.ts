import { z } from 'zod'

/** Controls of both sets but tab and line breaks, and code points that stand for no character. */
const CONTROL = /[\u0000-\u0008\u000B\u000C\u000E-\u001F\u007F-\u009F]|\p{Noncharacter_Code_Point}/u
const BIDI = /[\u202A-\u202E\u2066-\u2069]/
/** Nothing that leaves ink: spaces, format marks, fillers, the joiner U+034F. */
const BLANK = /^(?:[\s\p{Cf}\u2800\u3164\u115F\u1160\uFFA0]|\u034F)*$/u
const BREAKS = /\r\n|[\r\n\u2028\u2029]/g
/** Flags of regions are written in tag characters, which show nothing anywhere else. */
const FLAG = /\u{1F3F4}[\u{E0020}-\u{E007E}]+\u{E007F}/gu
const TAG = /[\u{E0000}-\u{E007F}]/u
const MAX_BREAKS = 200

/**
 * Words a person typed: normalised to NFC and trimmed, never empty, without characters that do not show and without direction marks.
 * @param max longest accepted length in UTF-16 units.
 */
function words(max: number) {
  return z
    .string()
    .normalize('NFC')
    .trim()
    .max(max, { error: 'text.too_long' })
    .refine((text) => !BLANK.test(text), { error: 'text.required' })
    .refine((text) => text.isWellFormed() && !CONTROL.test(text) && !TAG.test(text.replace(FLAG, '')), { error: 'text.control' })
    .refine((text) => !BIDI.test(text), { error: 'text.bidi_control' })
}

/** One line of words: a name, a code, a source. */
export const lineText = (max: number) =>
  words(max).refine((text) => countBreaks(text) === 0, { error: 'text.line_break' })

/** Words that may run over several lines: a note, a reason. */
export const noteText = (max: number) =>
  words(max).refine((text) => countBreaks(text) <= MAX_BREAKS, { error: 'text.too_many_lines' })

const countBreaks = (text: string): number => text.match(BREAKS)?.length ?? 0
