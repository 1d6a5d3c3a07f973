import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto'

const CIPHER = 'aes-256-gcm'
const KEY_BYTES = 32
/** What GCM is made for, bytes. */
const NONCE_BYTES = 12

/** Seals a secret for one account: AES-256-GCM under a key drawn from the server's own secret, with the account as associated data. */
export function sealSecret(serverSecret: string, accountId: string, secret: string): string {
  const nonce = randomBytes(NONCE_BYTES)
  const cipher = createCipheriv(CIPHER, keyOf(serverSecret), nonce).setAAD(Buffer.from(accountId))
  const sealed = Buffer.concat([cipher.update(secret, 'utf8'), cipher.final()])
  return ['1', nonce.toString('base64url'), sealed.toString('base64url'), cipher.getAuthTag().toString('base64url')].join('.')
}

/** What `sealSecret` sealed. @throws {Error} for another account, another server secret, or text that was changed. */
export function openSecret(serverSecret: string, accountId: string, text: string): string {
  const [version, nonce = '', sealed = '', tag = ''] = text.split('.')
  if (version !== '1') throw new Error('A sealed secret of an unknown kind')
  const decipher = createDecipheriv(CIPHER, keyOf(serverSecret), Buffer.from(nonce, 'base64url'))
  decipher.setAAD(Buffer.from(accountId)).setAuthTag(Buffer.from(tag, 'base64url'))
  return Buffer.concat([decipher.update(Buffer.from(sealed, 'base64url')), decipher.final()]).toString('utf8')
}

function keyOf(serverSecret: string): Buffer {
  return Buffer.from(hkdfSync('sha256', serverSecret, '', 'second factor', KEY_BYTES))
}
