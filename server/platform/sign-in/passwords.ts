import { hash, verify } from '@node-rs/argon2'
import { randomInt } from 'node:crypto'

// OWASP password storage cheat sheet's argon2id minimum: 19 MiB, two passes (figures from memory).
const cost = { memoryCost: 19456, timeCost: 2, parallelism: 1 }

/** Hashes a password with argon2id. */
export function hashPassword(password: string): Promise<string> {
  return hash(password, cost)
}

/** Whether a password is the one that was hashed. A hash that cannot be read is not a match. */
export async function isPassword(passwordHash: string, password: string): Promise<boolean> {
  try {
    return await verify(passwordHash, password)
  } catch {
    return false
  }
}

/** Compared when nobody has the e-mail, so that the answer takes as long as for a wrong password. */
let decoy: Promise<string> | undefined
export function decoyHash(): Promise<string> {
  decoy ??= hashPassword('nobody has this password')
  return decoy
}

// Letters that are not mistaken for one another when read from a slip of paper.
const letters = 'abcdefghjkmnpqrstuvwxyz23456789'

/** A password for one sign-in, such as `k7mw-3rft-x9ch`. */
export function makeOneTimePassword(): string {
  const group = () => Array.from({ length: 4 }, () => letters[randomInt(letters.length)]).join('')
  return `${group()}-${group()}-${group()}`
}
