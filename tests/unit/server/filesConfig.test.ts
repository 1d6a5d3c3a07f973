import { describe, expect, it } from 'vitest'
import { readConfig } from '../../../server/config.ts'

const base = {
  DATABASE_URL: 'postgresql://app@127.0.0.1/x', DATABASE_OWNER_URL: 'postgresql://owner@127.0.0.1/x', SESSION_SECRET: 'x'.repeat(32),
}

describe('where photos and papers are kept', () => {
  it('is a folder of the data by default, 5,000 MB a farm', () => {
    expect(readConfig({ ...base, DATA_DIR: '/srv/leaf' }).files).toEqual({ folder: '/srv/leaf/files', bucket: null, quotaBytes: 5_000_000_000 })
    expect(readConfig({ ...base, FILES_FOLDER: '/mnt/papers', FILES_QUOTA_MB: '200' }).files).toEqual({ folder: '/mnt/papers', bucket: null, quotaBytes: 200_000_000 })
  })

  it('is a bucket where one is named, and then its key is needed', () => {
    const named = { ...base, S3_BUCKET: 'papers', S3_KEY_ID: 'k', S3_SECRET: 's', S3_ENDPOINT: 'https://store.example' }
    expect(readConfig(named).files.bucket).toEqual({ name: 'papers', keyId: 'k', secret: 's', endpoint: 'https://store.example', region: 'us-east-1' })
    expect(() => readConfig({ ...base, S3_BUCKET: 'papers' })).toThrow('S3_KEY_ID must be given with S3_BUCKET; S3_SECRET must be given with S3_BUCKET')
  })
})
