import { defineMessages } from './define-messages.ts'

/** Words that every printed document shares; what only one document says stands in that document's own catalogue. */
export const documentWords = defineMessages({
  page: ({ page, pages }: { page: number; pages: number }) => `Page ${page} of ${pages}`,
  recordCheck: ({ fingerprint }: { fingerprint: string }) => `Record check ${fingerprint}`,
  recordIntact: 'The text matches what was signed',
  licenceUnreadable: 'signer and licence can’t be read any more',
  recordBroken: 'Record check failed: this is not the text that was signed. Do not act on it.',
  recordUnknownKey: 'Signed with a key that this installation does not know',
  signedAs: ({ meaning }: { meaning: string }) => `Signed as ${meaning}`,
  signedBy: ({ name, at }: { name: string; at: string }) => `Signed by ${name}, ${at}`,
  signerRole: 'veterinarian',
  registration: ({ number, until }: { number: string; until: string }) =>
    `controlled-substance registration ${number}, valid to ${until}`,
  licence: ({ number, until }: { number: string; until: string }) => `licence ${number}, valid to ${until}`,
  fingerprintInFull: 'Record check in full',
  scanToCheck: 'Is this paper still current?',
  lookUp: ({ address }: { address: string }) => `Looked up at ${address}`,
  printed: ({ at, by }: { at: string; by: string }) => `Printed ${at}, by ${by}.`,
  laterVersion: 'A later version may exist.',
  notSigned: 'Not signed',
  draftNotice: 'Draft, not signed. Do not dose from this page.',
  heldNotice: 'Held. Do not dose until a veterinarian lifts the hold.',
  supersededNotice: ({ version }: { version: string }) =>
    `Superseded by ${version}. Do not act on this page.`,
  stop: 'STOP',
  warning: 'WARNING',
  note: 'NOTE',
  stopIf: 'STOP IF',
  standingCautionTitle: 'Decision support for licensed professionals',
  standingCaution:
    'Amounts and cautions are worked out from what was entered and do not replace the judgement of a licensed ' +
    'professional. Before use, check local law, the product label and its safety data sheet.',
})
