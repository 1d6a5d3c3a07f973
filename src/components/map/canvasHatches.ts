import type { Hatch } from './hatches.ts'

/** Drawn larger than shown, so that screens of many pixels have a fine one. */
const OVERSAMPLE = 2

interface Tile { size: number; ink: string; forced: string; turn: number; draw(brush: CanvasRenderingContext2D): void }

const upright = (x: number, height: number, width: number) => (brush: CanvasRenderingContext2D): void => {
  brush.lineWidth = width
  brush.beginPath()
  brush.moveTo(x, 0)
  brush.lineTo(x, height)
  brush.stroke()
}

/** The same hatches as MapPatterns.vue has for blocks that are elements. */
const TILES: Record<Hatch, Tile> = {
  foliar: {
    size: 9, ink: '--elder', forced: 'CanvasText', turn: 0,
    draw(brush) {
      for (const at of [2.5, 7]) {
        brush.beginPath()
        brush.arc(at, at, 1.05, 0, 2 * Math.PI)
        brush.fill()
      }
    },
  },
  drench: { size: 6.5, ink: '--woad', forced: 'LinkText', turn: 0, draw: upright(3, 6.5, 1.3) },
  hold: { size: 7, ink: '--madder', forced: 'Mark', turn: 45, draw: upright(3.5, 7, 1.8) },
}

/** A hatch for a canvas, in the ink of the page's light; null where the browser lends no canvas. @param host an element with the page's tokens. */
export function canvasHatch(host: HTMLElement, hatch: Hatch): CanvasPattern | null {
  const { size, ink, forced, turn, draw } = TILES[hatch]
  const tile = document.createElement('canvas')
  tile.width = tile.height = size * OVERSAMPLE
  const brush = tile.getContext('2d')
  if (brush === null) return null
  brush.scale(OVERSAMPLE, OVERSAMPLE)
  brush.fillStyle = brush.strokeStyle = window.matchMedia('(forced-colors: active)').matches ? forced : getComputedStyle(host).getPropertyValue(ink).trim()
  draw(brush)
  const pattern = brush.createPattern(tile, 'repeat')
  pattern?.setTransform(new DOMMatrix().rotate(turn).scale(1 / OVERSAMPLE))
  return pattern
}
