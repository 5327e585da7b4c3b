import { createHash, createPrivateKey, createPublicKey, generateKeyPairSync, sign, verify } from 'node:crypto'
import type { KeyObject } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/** What a sealed text turns out to be when it is read again. */
export type SealState = 'intact' | 'broken' | 'unknown-key'

export interface Seal {
  /** SHA-256 of the text, hex */
  hash: string
  /** Ed25519 signature over the hash, base64 */
  signature: string
  keyId: string
}

export interface Signer {
  /** Short name of the installation's key: first 16 hex digits of the SHA-256 of its public half. */
  keyId: string
  publicKeyPem: string
  seal(text: string): Seal
  /** Checks a text against its seal; never throws. */
  check(text: string, seal: Seal): SealState
}

/** Signatures remembered as proven, about 2 MB. */
const provenAtMost = 10_000
const keyFile = 'signing-key.pem'
export const hashOf = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex')

const pemOf = (key: KeyObject) => key.export({ type: 'spki', format: 'pem' }).toString()
const idOf = (key: KeyObject) => hashOf(pemOf(key)).slice(0, 16)

function loadOrMakeKey(folder: string): KeyObject {
  const file = path.join(folder, keyFile)
  if (!existsSync(file)) {
    mkdirSync(folder, { recursive: true, mode: 0o700 })
    const { privateKey } = generateKeyPairSync('ed25519')
    // wx: two processes starting together must not each write a key of their own
    try {
      writeFileSync(file, privateKey.export({ type: 'pkcs8', format: 'pem' }), { mode: 0o600, flag: 'wx' })
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
    }
  }
  return createPrivateKey(readFileSync(file))
}

/** Public keys of earlier installations whose records were taken over, as *.pub.pem beside the key. */
function trustedKeys(folder: string): Map<string, KeyObject> {
  const files = readdirSync(folder).filter((name) => name.endsWith('.pub.pem'))
  const keys = files.map((name) => createPublicKey(readFileSync(path.join(folder, name))))
  return new Map(keys.map((key) => [idOf(key), key]))
}

/**
 * The installation's Ed25519 key, made once and kept in the data folder (so it belongs into the backup). A bare hash
 * could be recomputed by whoever edits the database; this signature cannot.
 */
export function createSigner(folder: string): Signer {
  const privateKey = loadOrMakeKey(folder)
  const publicKey = createPublicKey(privateKey)
  const keyId = idOf(publicKey)
  const proven = new Set<string>()
  const known = trustedKeys(folder).set(keyId, publicKey)
  return {
    keyId,
    publicKeyPem: pemOf(publicKey),
    seal(text) {
      const hash = hashOf(text)
      return { hash, signature: sign(null, Buffer.from(hash, 'hex'), privateKey).toString('base64'), keyId }
    },
    check(text, { hash, signature, keyId: usedKey }) {
      if (hashOf(text) !== hash) return 'broken'
      const key = known.get(usedKey)
      if (!key) return 'unknown-key'
      const sealed = `${usedKey} ${hash} ${signature}`
      if (proven.has(sealed)) return 'intact'
      if (!verify(null, Buffer.from(hash, 'hex'), key, Buffer.from(signature, 'base64'))) return 'broken'
      // lists check every row each time: a signature that fits its hash fits it for ever
      if (proven.size >= provenAtMost) proven.clear()
      proven.add(sealed)
      return 'intact'
    },
  }
}
