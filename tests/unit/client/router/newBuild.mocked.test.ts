import { beforeEach, describe, expect, it, vi } from 'vitest'
import { openNewBuild } from '../../../../src/stores/newBuild.ts'

vi.mock('../../../../src/plugins/device.ts', () => ({ device: {} }))

const pageOf = (entry: string): string => `<!doctype html><html><head><script type="module" crossorigin src="${entry}"></script></head><body></body></html>`
const open = vi.fn()
const served = (page: string) => ({ readPage: () => Promise.resolve(page), open })

beforeEach(() => {
  open.mockReset()
  sessionStorage.clear()
  document.head.innerHTML = '<script type="module" src="/assets/index-old.js"></script>'
})

describe('a part of the page that cannot be read', () => {
  it('opens the wanted address anew where the server has a new build', async () => {
    expect(await openNewBuild('/register/new?draft=d1', served(pageOf('/assets/index-new.js')))).toBe(true)
    expect(open).toHaveBeenCalledExactlyOnceWith('/register/new?draft=d1')
  })

  it('does so once a build, so that a part that is gone for good leads round no circle', async () => {
    await openNewBuild('/blocks', served(pageOf('/assets/index-new.js')))
    expect(await openNewBuild('/blocks', served(pageOf('/assets/index-new.js')))).toBe(false)
    expect(open).toHaveBeenCalledOnce()
    expect(await openNewBuild('/blocks', served(pageOf('/assets/index-newer.js')))).toBe(true)
  })

  it('stays where the build is the same, where there is no signal, and where something else answers', async () => {
    expect(await openNewBuild('/blocks', served(pageOf('/assets/index-old.js')))).toBe(false)
    expect(await openNewBuild('/blocks', { readPage: () => Promise.reject(new TypeError('Failed to fetch')), open })).toBe(false)
    expect(await openNewBuild('/blocks', served('<p>Sign in to this network</p>'))).toBe(false)
    expect(open).not.toHaveBeenCalled()
  })
})
