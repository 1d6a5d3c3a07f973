import { DeleteObjectCommand, GetObjectCommand, HeadObjectCommand, NotFound, PutObjectCommand, S3Client } from '@aws-sdk/client-s3'
import { atStore, type FileKey, type FileStore } from './fileStore.ts'

export interface Bucket {
  name: string
  /** Address of the store where it is not the maker's own; its buckets are then paths. */
  endpoint: string | null
  region: string
  keyId: string
  secret: string
}

const PATIENCE = { connectionTimeout: 5_000, requestTimeout: 20_000 }

/** Files in a bucket of a store that speaks the S3 API: farm/digest. */
export function createBucketFiles({ name: Bucket, endpoint, region, keyId, secret }: Bucket): FileStore {
  const client = new S3Client({
    region,
    credentials: { accessKeyId: keyId, secretAccessKey: secret },
    requestHandler: PATIENCE,
    // Not every store knows the newer checksums; what is read is held against its own digest.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    ...(endpoint !== null && { endpoint, forcePathStyle: true }),
  })
  const at = ({ farmId, digest }: FileKey) => ({ Bucket, Key: `${farmId}/${digest}` })
  return {
    put: (key, bytes) => atStore('keep a file', async () => void (await client.send(new PutObjectCommand({ ...at(key), Body: bytes, ContentLength: bytes.length })))),
    has: (key) => atStore('look for a file', () => client.send(new HeadObjectCommand(at(key))).then(() => true, isAbsent)),
    read: (key) => atStore('read a file', async () => {
      const { Body } = await client.send(new GetObjectCommand(at(key)))
      if (!Body) throw new Error('The answer holds no file')
      return Buffer.from(await Body.transformToByteArray())
    }),
    remove: (key) => atStore('remove a file', async () => void (await client.send(new DeleteObjectCommand(at(key))))),
  }
}

function isAbsent(cause: unknown): false {
  if (cause instanceof NotFound) return false
  throw cause
}
