import { hash, verify } from '@node-rs/argon2'

/** argon2id with the parameters of OWASP's Password Storage Cheat Sheet (19 MiB, 2 passes, 1 lane). */
const parameters = { memoryCost: 19_456, timeCost: 2, parallelism: 1 }

export function hashPassword(password: string): Promise<string> {
  return hash(password, parameters)
}

export function verifyPassword(passwordHash: string, password: string): Promise<boolean> {
  return verify(passwordHash, password)
}

let dummy: Promise<string> | undefined

/** The same work as a true check, so that the time taken does not tell whether an address is known. */
export async function verifyAgainstNobody(password: string): Promise<false> {
  dummy ??= hashPassword('nobody has this password')
  await verifyPassword(await dummy, password)
  return false
}
