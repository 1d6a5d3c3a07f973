import type { TextStyle } from './canvas.ts'

const INK = '#000000'
const DIM = '#333333'
/** The one colour of the page; on a black printer it is a dark grey. */
export const ELDER = '#53386B'
export const MADDER = '#AE3A2D'

const body: TextStyle = { size: 9, leading: 12, weight: 'regular', color: INK }
const small: TextStyle = { size: 8.25, leading: 10, weight: 'regular', color: INK }

/** Every setting of words on a report; sizes and leadings in points. */
export const STYLES = {
  body,
  bodyBold: { ...body, weight: 'bold' },
  label: { size: 8, leading: 12, weight: 'semibold', color: DIM },
  head: { size: 9.75, leading: 13.5, weight: 'bold', color: INK },
  columnHead: { size: 8, leading: 10.5, weight: 'semibold', color: INK },
  small,
  smallBold: { ...small, weight: 'bold' },
  smallSemibold: { ...small, weight: 'semibold' },
  running: { ...small, leading: 11.25 },
  runningBold: { ...small, leading: 11.25, weight: 'bold' },
  note: { size: 8, leading: 10, weight: 'regular', color: DIM },
  method: { size: 11.25, leading: 15, weight: 'bold', color: INK },
  stamp: { size: 46, leading: 42, weight: 'black', color: ELDER },
  stampYear: { size: 46, leading: 42, weight: 'regular', color: ELDER },
} as const satisfies Record<string, TextStyle>

export const RULES = { ink: INK, hair: '#C9C9C9', account: '#8B79A0' }
