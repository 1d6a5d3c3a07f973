/** What the PDF library takes and its published types do not say. */
declare module 'fontkit' {
  export interface Font {
    postscriptName: string
    characterSet: number[]
    layout(text: string): unknown
  }
  export function create(bytes: Uint8Array): Font
}

declare namespace PDFKit.Mixins {
  interface PDFFont {
    /** An opened font under a name. */
    registerFont(name: string, font: import('fontkit').Font): this
  }
  interface StructureElementOptions {
    /** What a head cell is the head of. */
    scope?: 'Column' | 'Row'
    /** Left, top, right, bottom on the page, points from its top left. */
    bbox?: [number, number, number, number]
    placement?: 'Block' | 'Inline'
  }
}
