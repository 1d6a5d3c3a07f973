import { ref } from 'vue'
import { z } from 'zod'
import { describe, expect, it } from 'vitest'
import { NetworkError } from '../../../../src/api/errors.ts'
import { useMerge } from '../../../../src/composables/form/useMerge.ts'
import { staleWith } from '../forms/inSetup.ts'

const schema = z.object({ revision: z.number(), name: z.string(), phone: z.string().nullable(), rules: z.array(z.string()) })
const opened = { revision: 4, name: 'Lower field', phone: null, rules: ['us'] }
const draftOf = ({ name, phone, rules }: z.infer<typeof schema>) => ({ name, phone: phone ?? '', rules: [...rules] })

function open() {
  const draft = ref(draftOf(opened))
  return { draft, merge: useMerge({ draft, opened, schema, draftOf }) }
}

describe('a form over what another changed meanwhile', () => {
  it('takes over what was not touched here, keeps what only was typed here, and writes over the newer revision', () => {
    const { draft, merge } = open()
    draft.value.name = 'Low field'
    expect(merge.meet(staleWith({ ...opened, revision: 7, phone: '0151', rules: ['us', 'eu'] }))).toBe(true)
    expect(draft.value).toEqual({ name: 'Low field', phone: '0151', rules: ['us', 'eu'] })
    expect(merge.taken.value).toEqual(['phone', 'rules'])
    expect(merge.clashes.value).toEqual([])
    expect(merge.revision.value).toBe(7)
  })

  it('asks only of what both changed in different ways, and each side can be chosen', () => {
    const { draft, merge } = open()
    Object.assign(draft.value, { name: 'Mine', phone: 'same' })
    merge.meet(staleWith({ ...opened, revision: 5, name: 'Theirs', phone: 'same' }))
    expect(merge.clashes.value).toEqual([{ field: 'name', mine: 'Mine', theirs: 'Theirs' }])
    expect(merge.taken.value).toEqual([])
    merge.choose('name', 'theirs')
    expect(draft.value.name).toBe('Theirs')
    expect(merge.clashes.value).toEqual([])
    draft.value.name = 'Mine again'
    merge.meet(staleWith({ ...opened, revision: 6, name: 'Theirs twice', phone: 'same' }))
    merge.choose('name', 'mine')
    expect(draft.value.name).toBe('Mine again')
    expect(merge.revision.value).toBe(6)
  })

  it.each([new NetworkError(), staleWith({ revision: 'none' }), staleWith(undefined), null])('leaves alone what was refused for something else: %#', (error) => {
    const { draft, merge } = open()
    draft.value.name = 'Mine'
    expect(merge.meet(error)).toBe(false)
    expect(draft.value.name).toBe('Mine')
    expect(merge.revision.value).toBe(4)
  })
})
