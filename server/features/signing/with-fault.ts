import type { RecordFault, SignatureBlock } from '../../../shared/contracts/signing.contract.ts'

/** The block of a record that fails a check beyond that of its text. */
export const withFault = (block: SignatureBlock, fault: RecordFault): SignatureBlock => ({
  ...block,
  state: 'broken',
  fault,
})
