import { afterEach, describe, expect, it, vi } from 'vitest'
import { nextTick } from 'vue'
import AppButton from '../../../../src/components/app/AppButton.vue'
import AppMeasure from '../../../../src/components/app/AppMeasure.vue'
import AppSegment from '../../../../src/components/app/AppSegment.vue'
import AppSelect from '../../../../src/components/app/AppSelect.vue'
import AppText from '../../../../src/components/app/AppText.vue'
import SelectList from '../../../../src/components/app/SelectList.vue'
import AppTime from '../../../../src/components/app/AppTime.vue'
import { mountWithWords } from '../mountWithWords.ts'

afterEach(() => { document.body.replaceChildren() })

describe('AppText', () => {
  it('ties its label and its error to the control', async () => {
    const text = mountWithWords(AppText, { modelValue: '', label: 'Code', name: 'code', error: 'Write something here.' })
    await nextTick()
    const input = text.get('input')
    expect(text.get('label').attributes('for')).toBe(input.attributes('id'))
    expect(input.attributes('aria-invalid')).toBe('true')
    expect(text.get(`#${input.attributes('aria-describedby')}`).text()).toBe('Write something here.')
  })

  it('shows a password and hides it again', async () => {
    const text = mountWithWords(AppText, { modelValue: 'a b', label: 'Password', name: 'password', type: 'password' })
    expect(text.get('input').attributes('type')).toBe('password')
    await text.get('button.reveal').trigger('click')
    expect(text.get('input').attributes('type')).toBe('text')
    expect(text.get('button.reveal').attributes('aria-pressed')).toBe('true')
  })
})

describe('AppMeasure', () => {
  const props = { modelValue: '1½', label: 'Tank', unit: 'L' }

  it('says what it understood where that is not plain', () => {
    expect(mountWithWords(AppMeasure, props).get('.hint').text()).toBe('1.5 L')
    expect(mountWithWords(AppMeasure, { ...props, modelValue: '1.5' }).find('.hint').exists()).toBe(false)
    expect(mountWithWords(AppMeasure, { ...props, modelValue: '12abc' }).find('.hint').exists()).toBe(false)
  })

  it('keeps what is typed, as it is typed', async () => {
    const measure = mountWithWords(AppMeasure, props)
    await measure.get('input').setValue('2,50')
    expect(measure.emitted('update:modelValue')).toEqual([['2,50']])
  })

  it('offers its units in a menu', async () => {
    const measure = mountWithWords(AppMeasure, { ...props, units: [{ value: 'L', label: 'L' }, { value: 'galUS', label: 'US gal' }] })
    await measure.get('select').setValue('galUS')
    expect(measure.emitted('update:unit')).toEqual([['galUS']])
  })

  it('counts by its step', async () => {
    const measure = mountWithWords(AppMeasure, { ...props, modelValue: '40', steps: 5 })
    await measure.get('button[aria-label="Less, Tank"]').trigger('click')
    expect(measure.emitted('update:modelValue')).toEqual([['35']])
  })

  it('takes no typing where the program worked it out', () => {
    const measure = mountWithWords(AppMeasure, { ...props, workedOut: true })
    expect(measure.get('input').attributes()).toHaveProperty('readonly')
    expect(measure.get('.inp').classes()).toContain('dim')
  })
})

describe('AppTime', () => {
  it('gives the time as it is typed and writes it out when the field is left', async () => {
    const time = mountWithWords(AppTime, { modelValue: '', label: 'Start' })
    await time.get('input').setValue('735')
    expect(time.emitted('update:modelValue')?.at(-1)).toEqual(['07:35'])
    await time.get('input').trigger('blur')
    expect(time.get('input').element.value).toBe('07:35')
  })

  it('says how to write it when it is no time', async () => {
    const time = mountWithWords(AppTime, { modelValue: '', label: 'Start' })
    await time.get('input').setValue('noon')
    await time.get('input').trigger('blur')
    expect(time.get('.err').text()).toBe('Write the time as 06:41.')
  })
})

describe('AppSegment', () => {
  it('is a group of radio buttons with a name', async () => {
    const segment = mountWithWords(AppSegment, { modelValue: 'day', label: 'Light', options: [{ value: 'day', label: 'Day' }, { value: 'dawn', label: 'Dawn' }] })
    expect(segment.get('legend').text()).toBe('Light')
    await segment.get('input[value="dawn"]').setValue(true)
    expect(segment.emitted('update:modelValue')).toEqual([['dawn']])
  })
})

describe('AppSelect', () => {
  it('keeps Escape for its list while that is open, and leaves it to the dialog around it when closed', async () => {
    const heard: string[] = []
    const hear = (event: KeyboardEvent): void => { heard.push(event.key) }
    document.addEventListener('keydown', hear)
    const select = mountWithWords(SelectList, { modelValue: null, id: 'kind', label: 'Kind', placeholder: 'choose', options: [{ value: 'soap', label: 'Soap' }] })
    const box = select.get('[role="combobox"]')
    await box.trigger('keydown', { key: 'Escape', code: 'Escape' })
    expect(heard).toEqual(['Escape'])
    await box.trigger('click')
    expect(box.attributes('aria-expanded')).toBe('true')
    await box.trigger('keydown', { key: 'Escape', code: 'Escape' })
    expect(heard).toEqual(['Escape'])
    expect(box.attributes('aria-expanded')).toBe('false')
    document.removeEventListener('keydown', hear)
  })

  it('is the list of the device itself under a finger, by its label, and says none as null', async () => {
    vi.stubGlobal('matchMedia', () => ({ matches: true, addEventListener: () => undefined, removeEventListener: () => undefined }))
    const select = mountWithWords(AppSelect, { modelValue: null, label: 'Kind', clearable: true, error: 'Choose one', options: [{ value: 'soap', label: 'Soap', note: '2 L left' }] })
    const box = select.get('select')
    expect(select.get('label').attributes('for')).toBe(box.attributes('id'))
    expect(box.attributes()).toMatchObject({ 'aria-invalid': 'true', 'aria-describedby': `${box.attributes('id') ?? ''}-note` })
    expect(box.findAll('option').map((option) => option.text())).toEqual(['Choose', 'Soap – 2 L left'])
    await box.setValue('soap')
    await box.setValue('')
    expect(select.emitted('update:modelValue')).toEqual([['soap'], [null]])
    vi.unstubAllGlobals()
  })
})

describe('AppButton', () => {
  it('takes no second press while it works', async () => {
    const button = mountWithWords(AppButton, { busy: true }, { default: 'Sign' })
    await button.get('button').trigger('click')
    expect(button.emitted('click')).toBeUndefined()
    expect(button.get('button').attributes('aria-busy')).toBe('true')
  })
})
