import { describe, expect, it } from 'vitest'
import { mapKeyAction, type MapKey } from '../../../../src/components/map/mapKeyAction.ts'
import { neighbourOf } from '../../../../src/components/map/neighbourOf.ts'
import type { Pixel } from '../../../../src/composables/map/mapTypes.ts'

const key = (name: string, held: Partial<MapKey> = {}): MapKey => ({
  key: name, shiftKey: false, altKey: false, ctrlKey: false, metaKey: false, ...held,
})

describe('mapKeyAction', () => {
  it.each([
    { held: {}, metres: 1 },
    { held: { shiftKey: true }, metres: 10 },
    { held: { altKey: true }, metres: 0.1 },
  ])('moves the cross $metres m with $held', ({ held, metres }) => {
    expect(mapKeyAction(key('ArrowRight', held), 'draw')).toEqual({ do: 'cross', eastM: metres, northM: 0 })
    expect(mapKeyAction(key('ArrowUp', held), 'draw')).toEqual({ do: 'cross', eastM: 0, northM: metres })
    expect(mapKeyAction(key('ArrowDown', held), 'draw')).toEqual({ do: 'cross', eastM: 0, northM: -metres })
  })

  it.each([
    [' ', 'addPoint'], ['Backspace', 'removePoint'], ['Enter', 'close'], ['Escape', 'leave'],
  ])('while drawing %j does %s', (name, does) => {
    expect(mapKeyAction(key(name), 'draw')).toEqual({ do: does })
  })

  it('goes from block to block while looking, and pans with Shift', () => {
    expect(mapKeyAction(key('ArrowLeft'), 'look')).toEqual({ do: 'neighbour', dx: -1, dy: 0 })
    expect(mapKeyAction(key('ArrowLeft', { shiftKey: true }), 'look')).toEqual({ do: 'pan', dx: -80, dy: 0 })
    expect(mapKeyAction(key('Enter'), 'look')).toEqual({ do: 'open' })
  })

  it.each(['look', 'draw'] as const)('zooms with plus and minus in %s', (mode) => {
    expect(mapKeyAction(key('+'), mode)).toEqual({ do: 'zoom', by: 1 })
    expect(mapKeyAction(key('-'), mode)).toEqual({ do: 'zoom', by: -1 })
  })

  it('undoes and redoes while drawing only', () => {
    expect(mapKeyAction(key('z', { ctrlKey: true }), 'draw')).toEqual({ do: 'undo' })
    expect(mapKeyAction(key('Z', { metaKey: true, shiftKey: true }), 'draw')).toEqual({ do: 'redo' })
    expect(mapKeyAction(key('z', { ctrlKey: true }), 'look')).toBeNull()
  })

  it('leaves Tab and letters to the browser', () => {
    expect(mapKeyAction(key('Tab'), 'draw')).toBeNull()
    expect(mapKeyAction(key('a'), 'look')).toBeNull()
    expect(mapKeyAction(key(' '), 'look')).toBeNull()
  })
})

describe('neighbourOf', () => {
  const middles = new Map<string, Pixel>([['west', [0, 100]], ['mid', [100, 100]], ['east', [220, 110]], ['north', [110, 0]]])

  it('finds the nearest that way', () => {
    expect(neighbourOf(middles, 'mid', [1, 0])).toBe('east')
    expect(neighbourOf(middles, 'mid', [-1, 0])).toBe('west')
    expect(neighbourOf(middles, 'mid', [0, -1])).toBe('north')
  })
  it('finds none where nothing lies', () => {
    expect(neighbourOf(middles, 'mid', [0, 1])).toBeNull()
    expect(neighbourOf(new Map(), null, [1, 0])).toBeNull()
  })
  it('begins at the edge where nothing is chosen', () => {
    expect(neighbourOf(middles, null, [1, 0])).toBe('west')
    expect(neighbourOf(middles, 'gone', [0, 1])).toBe('north')
  })
})
