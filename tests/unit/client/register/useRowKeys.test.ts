import { mount } from '@vue/test-utils'
import { afterEach, describe, expect, it } from 'vitest'
import { defineComponent, h, ref } from 'vue'
import { useRowKeys } from '../../../../src/composables/register/useRowKeys.ts'

const IDS = ['a', 'b', 'c']
const opened: string[] = []
const chosen = ref<string | null>(null)

const Host = defineComponent({
  setup() {
    useRowKeys({ ids: () => IDS, chosen: () => chosen.value, choose: (id) => { chosen.value = id }, open: (id) => { opened.push(id) } })
    return () => h('div', [
      ...IDS.map((id) => h('p', { 'data-row': id }, [h('a', { href: `#${id}` }, id)])),
      h('input', { id: 'typing' }),
      h('button', { id: 'elsewhere' }),
    ])
  },
})

function press(key: string, on: Element | Window = window, init: KeyboardEventInit = {}): void {
  on.dispatchEvent(new KeyboardEvent('keydown', { key, bubbles: true, cancelable: true, ...init }))
}

function mountHost(): ReturnType<typeof mount> {
  Element.prototype.scrollIntoView = () => undefined
  chosen.value = null
  opened.length = 0
  return mount(Host, { attachTo: document.body })
}

let host: ReturnType<typeof mount> | undefined
afterEach(() => { host?.unmount() })

describe('useRowKeys', () => {
  it('walks down with J and up with K and stops at both ends', () => {
    host = mountHost()
    const walked = ['j', 'j', 'j', 'j', 'k', 'k', 'k'].map((key) => { press(key); return chosen.value })
    expect(walked).toEqual(['a', 'b', 'c', 'c', 'b', 'a', 'a'])
  })

  it('opens the chosen row with Enter, and nothing before one is chosen', () => {
    host = mountHost()
    press('Enter')
    expect(opened).toEqual([])
    press('j')
    press('Enter')
    expect(opened).toEqual(['a'])
  })

  it('is silent while someone types, with a modifier, and on other buttons', () => {
    host = mountHost()
    press('j', host.get('#typing').element)
    press('j', window, { ctrlKey: true })
    expect(chosen.value).toBeNull()
    press('j')
    press('Enter', host.get('#elsewhere').element)
    expect(opened).toEqual([])
  })

  it('lets go of the keyboard when its page is left', () => {
    mountHost().unmount()
    press('j')
    expect(chosen.value).toBeNull()
  })
})
