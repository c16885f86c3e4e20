import { hash, verify } from '@node-rs/argon2'

/**
 * Argon2id with 19 MiB and two passes, the package's defaults and OWASP's first choice (Password Storage Cheat
 * Sheet, 2024): about 17 ms here. Never call it inside a transaction.
 */
export const hashPassword = (password: string): Promise<string> => hash(password)

/** Of a random password that was thrown away, with the same parameters. */
export const decoyHash =
  '$argon2id$v=19$m=19456,t=2,p=1$yQbnEQqvx4Lno5eLHZen7g$xf3vUs3c4U1wdK10gAWPnS0VepYU+xtsqTxAgtFCff8'

/** Whether the password fits. Without a hash the same work is done, so that time does not tell who has an account. */
export async function passwordFits(passwordHash: string | null, password: string): Promise<boolean> {
  const fits = await verify(passwordHash ?? decoyHash, password)
  return fits && passwordHash !== null
}
