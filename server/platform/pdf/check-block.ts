import type { DocumentBlock } from '../../../shared/domain/documents/pdf-document-model.ts'
import { documentWords } from '../../../shared/messages/documents.ts'

/** As many digits of a fingerprint as name one record; a short address makes a code that a telephone reads at once. */
const digitsThatName = 16
const sideMm = 22

/** The address at which anybody signed in sees whether a print is still to be acted on. */
const checkAddress = (publicUrl: string, hash: string): string =>
  `${publicUrl.replace(/\/+$/, '')}/check/${hash.slice(0, digitsThatName)}`

/** The fingerprint in full beside a code to scan: whether this paper is still current. */
export function checkBlock(
  publicUrl: string,
  hash: string,
  label: string = documentWords.fingerprintInFull,
): DocumentBlock {
  const address = checkAddress(publicUrl, hash)
  return {
    kind: 'columns',
    columns: [
      {
        share: 1,
        blocks: [{ kind: 'qr', text: address, sideMm, caption: documentWords.scanToCheck }],
      },
      {
        share: 3,
        blocks: [
          {
            kind: 'fingerprint',
            label,
            fingerprint: hash,
            lookUp: documentWords.lookUp({ address }),
          },
        ],
      },
    ],
  }
}
