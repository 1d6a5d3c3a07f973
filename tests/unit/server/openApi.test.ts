import { describe, expect, it } from 'vitest'
import { v7 as uuidV7 } from 'uuid'
import { buildBlock, buildLot, buildMaterial, buildRecord } from '../../../server/demo/buildThings.ts'
import { describeApi } from '../../../server/routes/openApi.ts'
import { ROUTES } from '../../../server/routes/routes.ts'

const api = JSON.parse(JSON.stringify(describeApi(ROUTES, { version: '1', sessionCookie: 'sid' }))) as ReturnType<typeof describeApi> & { components: Record<string, Record<string, unknown>> }
const operations = Object.entries(api.paths).flatMap(([path, methods]) => Object.entries(methods).map(([method, operation]) => ({ name: `${method} ${path}`, method, operation })))
const statuses = (name: string) => Object.keys(operations.find((entry) => entry.name === name)?.operation.responses ?? {})
const ids = { materialId: uuidV7(), blockId: uuidV7(), lotId: uuidV7() }

describe('the description of the API', () => {
  it('names each operation once', () => {
    expect(new Set(operations.map(({ operation }) => operation.operationId)).size).toBe(ROUTES.length)
  })

  it('refers only to what it holds', () => {
    const references = [...JSON.stringify(api).matchAll(/"\$ref":"([^"]+)"/g)].map((match) => match[1] ?? '')
    expect(references.length).toBeGreaterThan(ROUTES.length)
    for (const reference of new Set(references)) {
      const [root, part, group = '', name = ''] = reference.split('/')
      expect([root, part, api.components[group]?.[name]]).toEqual(['#', 'components', expect.any(Object)])
    }
  })

  it('asks for the header wherever something is written, and for a session wherever one is needed', () => {
    for (const { method, operation } of operations) {
      expect(JSON.stringify(operation.parameters).includes('OwnPages')).toBe(method !== 'get')
      expect(operation.security).toEqual(operation['x-roles'] === 'everybody' ? [] : [{ session: [] }])
    }
  })

  it('gives the statuses that there are', () => {
    expect(statuses('post /farms/{farmId}/blocks')).toEqual(['200', '201', '400', '401', '403', '404', '409', '413', '415', '422', 'default'])
    expect(statuses('post /farms/{farmId}/records/{id}/sign')).toEqual(['200', '400', '401', '403', '404', '409', '413', '415', '422', '429', 'default'])
    expect(statuses('delete /session')).toEqual(['204', '401', '403', '422', 'default'])
    expect(statuses('get /health')).toEqual(['200', '422', 'default'])
    const pdf = operations.find(({ name }) => name.endsWith('/pdf'))?.operation.responses['200']
    expect(pdf).toMatchObject({ content: { 'application/pdf': { schema: { type: 'string', format: 'binary' } } } })
  })

  it('describes an upload as a file beside its fields', () => {
    const upload = operations.find(({ name }) => name === 'post /farms/{farmId}/records/{id}/files')?.operation.requestBody
    expect(upload).toMatchObject({ content: { 'multipart/form-data': { schema: { properties: { file: {}, id: {}, kind: {} }, required: ['id', 'kind', 'file'] } } } })
    expect(statuses('post /farms/{farmId}/records/{id}/files')).toEqual(['200', '201', '400', '401', '403', '404', '409', '413', '415', '422', '503', 'default'])
  })

  it.each([
    { path: '/farms/:farmId/blocks', body: buildBlock() },
    { path: '/farms/:farmId/materials', body: buildMaterial() },
    { path: '/farms/:farmId/lots', body: buildLot({ materialId: ids.materialId }) },
    { path: '/farms/:farmId/records', body: buildRecord(ids) },
  ])('fits what is sent to $path', ({ path, body }) => {
    const route = ROUTES.find((candidate) => candidate.method === 'post' && candidate.path === path)
    expect(route?.body?.safeParse(body).success).toBe(true)
    const described = operations.find(({ name }) => name === `post ${path.replace(':farmId', '{farmId}')}`)?.operation.requestBody as
      { content: Record<string, { schema: { properties: object; required: string[]; additionalProperties: boolean } }> }
    const schema = described.content['application/json']?.schema
    expect(schema?.additionalProperties).toBe(false)
    expect(Object.keys(schema?.properties ?? {})).toEqual(expect.arrayContaining(Object.keys(body)))
    expect(Object.keys(body)).toEqual(expect.arrayContaining(schema?.required ?? []))
  })
})
