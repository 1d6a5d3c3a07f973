import { createPinia, setActivePinia } from 'pinia'
import { z } from 'zod'
import { beforeEach, describe, expect, it } from 'vitest'
import { civilDateSchema, idSchema } from '../../../../shared/contract/common.ts'
import { translate } from '../../../../shared/messages/translate.ts'
import { useSchemaErrors } from '../../../../src/composables/form/useSchemaErrors.ts'

const schema = z.object({ steps: z.array(z.object({
  materialId: idSchema, blockIds: z.array(idSchema).min(1), everyDays: z.number().int().min(1).max(400), firstOn: civilDateSchema, kind: z.enum(['a', 'b']), name: z.string().min(1, { error: 'text.required' }),
})) })
const fit = { materialId: '01a23383-d75a-76b5-976a-c3a8316a7462', blockIds: ['01a23383-d75a-76b5-976a-c3a8316a7463'], everyDays: 14, firstOn: '2026-06-01', kind: 'a', name: 'Soil' }
const say = (code: string, params?: Record<string, number>): string => translate('en', `problems.${code}`, params)

beforeEach(() => { setActivePinia(createPinia()) })

describe('what a schema says about a form', () => {
  it('is nothing where it fits', () => {
    expect(useSchemaErrors()(schema, { steps: [fit] })).toEqual({})
  })

  it.each<[field: string, value: unknown, code: string, params?: Record<string, number>]>([
    ['materialId', '', 'field.choose'], ['blockIds', [], 'field.choose'], ['everyDays', '', 'field.required'], ['everyDays', 'ten', 'number.format'], ['everyDays', 1.5, 'number.whole'],
    ['everyDays', 0, 'field.too_small', { minimum: 1 }], ['everyDays', 1000, 'field.too_big', { maximum: 400 }], ['firstOn', '', 'field.required'], ['firstOn', '2026-02-30', 'date.invalid'],
    ['kind', 'c', 'field.choose'], ['name', '', 'text.required'],
  ])('names %s of %j by what a person can do', (field, value, code, params) => {
    expect(useSchemaErrors()(schema, { steps: [{ ...fit, [field]: value }] })).toEqual({ [`steps.0.${field}`]: say(code, params) })
  })
})
