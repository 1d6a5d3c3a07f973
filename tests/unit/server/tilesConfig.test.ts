import { describe, expect, it } from 'vitest'
import { readConfig } from '../../../server/config.ts'

const BASE = { DATABASE_URL: 'postgres://app@x/y', DATABASE_OWNER_URL: 'postgres://owner@x/y', SESSION_SECRET: 'x'.repeat(32) }
const read = (more: Record<string, string>) => () => readConfig({ ...BASE, ...more }).tiles

describe('the tile service of the environment', () => {
  it('is none unless it is named', () => {
    expect(read({})()).toBeNull()
    expect(read({ TILE_ATTRIBUTION: 'Somebody' })()).toBeNull()
  })

  it('is an address with a host of its own and whose pictures they are', () => {
    const TILE_URL = 'https://tiles.example/v1/{z}/{x}/{y}@2x.jpg?key=abc'
    expect(read({ TILE_URL, TILE_ATTRIBUTION: 'Somebody' })()).toEqual({ template: TILE_URL, attribution: 'Somebody', maxZoom: 19 })
    expect(read({ TILE_URL, TILE_ATTRIBUTION: 'Somebody', TILE_MAX_ZOOM: '21' })()).toMatchObject({ maxZoom: 21 })
    expect(read({ TILE_URL })).toThrow('TILE_ATTRIBUTION must be given with TILE_URL')
  })

  it.each(['https://{x}.example/{z}/{x}/{y}', 'https://tiles.example/{z}/{x}', 'https://tiles.example/{z}/{x}/{y}/{s}', 'ftp://tiles.example/{z}/{x}/{y}', 'https://u:p@tiles.example/{z}/{x}/{y}', '/{z}/{x}/{y}'])('refuses %s', (TILE_URL) => {
    expect(read({ TILE_URL, TILE_ATTRIBUTION: 'Somebody' })).toThrow('TILE_URL must be the address of a tile')
  })
})
