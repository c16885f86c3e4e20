import { hash, verify } from '@node-rs/argon2'

/**
 * Argon2id with 19 MiB and two passes, the package's defaults and OWASP's first choice (Password Storage Cheat
 * Sheet, 2024): about 17 ms here. Never call it inside a transaction.
 */
export const hashPassword = (password: string): Promise<string> => hash(password)

let decoy: Promise<string> | undefined

/** Whether the password fits. Without a hash the same work is done, so that time does not tell who has an account. */
export async function passwordFits(passwordHash: string | null, password: string): Promise<boolean> {
  decoy ??= hash('nobody has this password')
  const fits = await verify(passwordHash ?? (await decoy), password)
  return fits && passwordHash !== null
}
