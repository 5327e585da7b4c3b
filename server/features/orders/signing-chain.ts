/** What the audit trail, the versions and the signed texts say of the signings of one order. */
export interface SigningChain {
  /** The texts of the audit entries of its signings, in order. */
  signings: readonly string[]
  /** Its versions with the hash of the text that each points at; null where there is no such text. */
  versions: readonly { versionNo: number; hash: string | null }[]
  /** Signed texts about the order that no version points at. */
  looseTexts: number
}

interface Signing {
  versionNo: number
  hash: string
}

function signingIn(text: string): Signing | null {
  try {
    const { after } = JSON.parse(text) as { after?: Partial<Signing> }
    return typeof after?.versionNo === 'number' && typeof after.hash === 'string'
      ? { versionNo: after.versionNo, hash: after.hash }
      : null
  } catch {
    return null
  }
}

/** The last signature that the audit trail tells of, and when; null where it tells of none. */
export function lastSigning({ signings }: SigningChain): { versionNo: number; at: Date } | null {
  const text = signings.at(-1)
  const signing = text === undefined ? null : signingIn(text)
  if (text === undefined || signing === null) return null
  return { versionNo: signing.versionNo, at: new Date((JSON.parse(text) as { at: string }).at) }
}

/**
 * The links that are missing between what was signed and what stands. A version taken away brings an older one back as
 * if it were in force, so an order with any link missing is not what was signed, whatever its newest version looks like.
 *
 * @returns each in a few words, for the record of a check; none of an order that is whole
 */
export function missingLinks({ signings, versions, looseTexts }: SigningChain): string[] {
  const missing: string[] = []
  const signed = signings.map(signingIn)
  if (signed.includes(null)) missing.push('an entry of the audit trail about a signature cannot be read')
  for (const one of signed) {
    if (one === null) continue
    const version = versions.find(({ versionNo }) => versionNo === one.versionNo)
    if (!version) missing.push(`version ${String(one.versionNo)} was signed and is gone`)
    else if (version.hash !== null && version.hash !== one.hash)
      missing.push(`version ${String(one.versionNo)} points at another text than was signed`)
  }
  for (const { versionNo, hash } of versions) {
    if (hash === null) missing.push(`the signed text of version ${String(versionNo)} is gone`)
    if (!signed.some((one) => one?.versionNo === versionNo))
      missing.push(`the audit trail knows no signature of version ${String(versionNo)}`)
  }
  if (looseTexts > 0) missing.push('a signed text belongs to no version')
  return missing
}
