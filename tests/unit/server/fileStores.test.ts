import { mkdir, mkdtemp, readdir, rm, stat, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { createBucketFiles } from '../../../server/adapters/files/bucketFiles.ts'
import { digestOfFile, FileStoreFault, readWhole, type FileStore } from '../../../server/adapters/files/fileStore.ts'
import { createFolderFiles } from '../../../server/adapters/files/folderFiles.ts'
import { openBucket, type TestBucket } from '../../support/openBucket.ts'

const FARM = '01a23166-d38a-7407-b386-c7381b87403e'
const bytes = Buffer.from('the bytes of a photo')
const key = { farmId: FARM, digest: digestOfFile(bytes) }

let folder: string
let bucket: TestBucket
let stores: Record<string, FileStore>

beforeEach(async () => {
  folder = join(await mkdtemp(join(tmpdir(), 'drenchleaf-files-')), 'files')
  bucket = await openBucket('papers')
  stores = {
    folder: createFolderFiles(folder),
    bucket: createBucketFiles({ name: 'papers', endpoint: bucket.url, region: 'xx-1', keyId: 'key', secret: 'secret' }),
  }
})
afterEach(async () => {
  await bucket.close()
  await rm(join(folder, '..'), { recursive: true, force: true })
})

const storeOf = (name: string): FileStore => {
  const store = stores[name]
  if (!store) throw new Error(`No store ${name}`)
  return store
}

it('digests as FIPS 180-4 says: the example "abc"', () => {
  expect(digestOfFile(Buffer.from('abc'))).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad')
})

describe.each(['folder', 'bucket'])('the %s', (name) => {
  it('keeps, gives back and forgets; doing so again changes nothing', async () => {
    const store = storeOf(name)
    expect(await store.has(key)).toBe(false)
    await store.put(key, bytes)
    await store.put(key, bytes)
    expect(await store.has(key)).toBe(true)
    expect(await readWhole(store, key)).toEqual(bytes)
    await store.remove(key)
    await store.remove(key)
    expect(await store.has(key)).toBe(false)
    await expect(store.read(key)).rejects.toBeInstanceOf(FileStoreFault)
  })

  it('keeps farms apart', async () => {
    const store = storeOf(name)
    await store.put(key, bytes)
    expect(await store.has({ ...key, farmId: '01a23166-0000-7407-b386-c7381b87403e' })).toBe(false)
  })

  it('gives back nothing but what it took in', async () => {
    const store = storeOf(name)
    await store.put(key, Buffer.from('other bytes'))
    await expect(readWhole(store, key)).rejects.toBeInstanceOf(FileStoreFault)
  })
})

describe('the folder', () => {
  it('lets nobody else read, and leaves no half file when the last step fails', async () => {
    await storeOf('folder').put(key, bytes)
    expect((await stat(join(folder, FARM))).mode & 0o777).toBe(0o700)
    expect((await stat(join(folder, FARM, key.digest))).mode & 0o777).toBe(0o600)
    const other = { ...key, digest: digestOfFile(Buffer.from('second')) }
    await mkdir(join(folder, FARM, other.digest))
    await expect(storeOf('folder').put(other, Buffer.from('second'))).rejects.toBeInstanceOf(FileStoreFault)
    expect((await readdir(join(folder, FARM))).filter((file) => file.endsWith('.part'))).toEqual([])
  })

  it('says so when it cannot be written', async () => {
    await writeFile(folder, 'no folder')
    await expect(storeOf('folder').put(key, bytes)).rejects.toBeInstanceOf(FileStoreFault)
  })
})

describe('the bucket', () => {
  it('is asked by path with a signature of version 4, farm and digest in the key', async () => {
    await storeOf('bucket').put(key, bytes)
    expect([...bucket.objects.keys()]).toEqual([`${FARM}/${key.digest}`])
    expect(bucket.signatures[0]).toMatch(/^AWS4-HMAC-SHA256 Credential=key\/\d{8}\/xx-1\/s3\/aws4_request/)
  })

  it('is no reason to call a file absent when it does not answer', async () => {
    bucket.failWith(403)
    await expect(storeOf('bucket').has(key)).rejects.toBeInstanceOf(FileStoreFault)
    await expect(storeOf('bucket').put(key, bytes)).rejects.toBeInstanceOf(FileStoreFault)
  })
})
