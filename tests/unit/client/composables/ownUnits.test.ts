import { QueryClient, VueQueryPlugin } from '@tanstack/vue-query'
import { mount } from '@vue/test-utils'
import { createPinia, setActivePinia } from 'pinia'
import { beforeEach, describe, expect, it } from 'vitest'
import { defineComponent, nextTick } from 'vue'
import { useFigures } from '../../../../src/composables/app/useFigures.ts'
import { i18n } from '../../../../src/plugins/i18n.ts'
import { usePreferences } from '../../../../src/stores/preferences.ts'

const figuresOf = (): ReturnType<typeof useFigures> => {
  let figures: ReturnType<typeof useFigures> | undefined
  mount(defineComponent({ setup: () => { figures = useFigures(); return () => null } }), { global: { plugins: [i18n, [VueQueryPlugin, { queryClient: new QueryClient() }]] } })
  if (figures === undefined) throw new Error('no figures')
  return figures
}

describe('figures in the person’s measures', () => {
  beforeEach(() => { localStorage.clear(); setActivePinia(createPinia()) })

  it('turn with the choice, at once, and leave what was typed alone', async () => {
    const preferences = usePreferences()
    const figures = figuresOf()
    const all = () => [figures.area(9_300), figures.unitOf('ha'), figures.volume(100), figures.perHa(500, 'L/ha'), figures.plain('25', 'm'), figures.plain('25'), figures.unit('L')]
    expect(all()).toEqual(['0.93', 'ha', '100.0\u00a0L', '500', '25', '25', 'L'])
    preferences.units = 'us'
    await nextTick()
    expect(all()).toEqual(['2.30', 'acre', '26.42\u00a0US gal', '53.45', '82.02', '25', 'L'])
    expect(figures.units(['L', 'galUS']).map(({ value }) => value)).toEqual(['galUS', 'L'])
  })

  it('are kept by the device until the person and the farm are read', async () => {
    usePreferences().units = 'us'
    await nextTick()
    setActivePinia(createPinia())
    expect(usePreferences().units).toBe('us')
  })

  it('say nothing of what is not known', () => {
    const figures = figuresOf()
    expect([figures.area(null), figures.volume(null), figures.amount('', 'L'), figures.plain(null, 'm')]).toEqual(['', '', '', ''])
  })
})
