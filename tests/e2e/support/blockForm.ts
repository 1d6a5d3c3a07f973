import type { Locator, Page } from '@playwright/test'
import { expect } from '@playwright/test'
import type { Block } from '../../../shared/contract/block.ts'
import { field } from './controls.ts'
import { say } from './words.ts'

/** West, south, east and north of everything drawn. */
export function extentOf(blocks: readonly Block[]): { west: number; south: number; east: number; north: number } {
  const corners = blocks.flatMap(({ geometry }) => (geometry.type === 'Polygon' ? geometry.coordinates : geometry.coordinates.flat()).flat())
  const [lons, lats] = [corners.map(([lon]) => lon), corners.map(([, lat]) => lat)]
  return { west: Math.min(...lons), south: Math.min(...lats), east: Math.max(...lons), north: Math.max(...lats) }
}

/** The page of a new block, on desk and phone alike. */
export class BlockForm {
  readonly page: Page
  readonly main: Locator
  readonly map: Locator

  constructor(page: Page) {
    this.page = page
    this.main = page.getByRole('main', { name: say('blocks.draw.title') })
    this.map = page.getByRole('application', { name: say('blocks.map.drawLabel') })
  }

  async open(by: 'draw' | 'points'): Promise<void> {
    await this.page.goto(`/blocks/new?by=${by}`)
    // Once the ground is there, the cross stands in the middle of what is drawn.
    if (by === 'draw') await expect(this.map.locator('path.leaflet-interactive').nth(23)).toBeAttached()
    else await expect(this.points).toBeVisible()
  }

  get points(): Locator {
    return field(this.main, say('blocks.points.label'))
  }

  get saveButton(): Locator {
    return this.main.getByRole('button', { name: new RegExp(`^(${say('blocks.form.save')}|${say('blocks.form.saveAll')})$`) })
  }

  async name(code: string): Promise<void> {
    await field(this.main, say('blocks.form.code')).fill(code)
    await field(this.main, say('blocks.form.name')).fill('Drawn by a test')
  }

  /** Moves the cross by tens of metres. */
  async step(arrow: 'ArrowLeft' | 'ArrowRight' | 'ArrowUp' | 'ArrowDown', tensOfMetres: number): Promise<void> {
    for (let step = 0; step < tensOfMetres; step += 1) await this.page.keyboard.press(`Shift+${arrow}`)
  }
}

/** A ring as one types it: latitude, longitude, a line each. */
export function typedPoints(ring: readonly (readonly [number, number])[]): string {
  return ring.map(([lon, lat]) => `${lat.toFixed(7)}, ${lon.toFixed(7)}`).join('\n')
}
