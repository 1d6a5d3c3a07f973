export type Weight = 'regular' | 'semibold' | 'bold' | 'black' | 'italic'

/** A file of a font package; the letters of one alphabet in one weight. */
export interface FontFile { face: string; path: string }

/** In the order in which they are asked for a letter. */
const SUBSETS = ['latin', 'latin-ext', 'greek', 'cyrillic', 'vietnamese', 'greek-ext', 'cyrillic-ext'] as const
const CUTS: Record<Weight, string> = {
  regular: '400-normal', semibold: '600-normal', bold: '700-normal', black: '800-normal', italic: '400-italic',
}

/** Asked where Noto Sans has no letter; the large ones last, they are opened once somebody writes so. */
const FALLBACKS = [
  // Noto draws dots apart from their letters, so that its words cannot be copied; it helps out with rare letters alone.
  { name: 'arabic', files: 'vazirmatn/files/vazirmatn-arabic' },
  { name: 'arabic-ext', files: 'noto-sans-arabic/files/noto-sans-arabic-arabic' },
  { name: 'hebrew', files: 'noto-sans-hebrew/files/noto-sans-hebrew-hebrew' },
  // The slice with the signs of comparison.
  { name: 'signs', files: 'noto-sans-kr/files/noto-sans-kr-98' },
  { name: 'emoji', files: 'noto-emoji/files/noto-emoji-emoji' },
  { name: 'han', files: 'noto-sans-sc/files/noto-sans-sc-chinese-simplified' },
  { name: 'hangul', files: 'noto-sans-kr/files/noto-sans-kr-korean' },
] as const

/** The files of Noto Sans in a weight. */
export function plainFiles(weight: Weight): FontFile[] {
  return SUBSETS.map((subset) => ({ face: `${weight}-${subset}`, path: `@fontsource/noto-sans/files/noto-sans-${subset}-${CUTS[weight]}.woff` }))
}

/** The files of other alphabets: two weights of each are enough. */
export function fallbackFiles(weight: Weight): FontFile[] {
  const cut = weight === 'regular' || weight === 'italic' ? 'regular' : 'bold'
  return FALLBACKS.map(({ name, files }) => ({ face: `${cut}-${name}`, path: `@fontsource/${files}-${CUTS[cut]}.woff` }))
}
