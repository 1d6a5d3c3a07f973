import { hash, verify } from '@node-rs/argon2'

/** OWASP's minimum for argon2id (19 MiB, two passes, one lane); the package's default algorithm is argon2id. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

/** A hash with its own salt and costs, as PHC text. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, COST)
}

let dummy: Promise<string> | undefined

/** Whether the password is the account's; takes as long for an account that has none or does not exist. */
export async function verifyPassword(passwordHash: string | null, password: string): Promise<boolean> {
  if (passwordHash !== null) return verify(passwordHash, password)
  dummy ??= hashPassword('nobody has this')
  await verify(await dummy, password)
  return false
}
