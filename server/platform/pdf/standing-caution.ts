import type { ParagraphBlock } from '../../../shared/domain/documents/pdf-document-model.ts'
import { documentWords } from '../../../shared/messages/documents.ts'

/** The caution that stands on every dose document, the last of its blocks. */
export function standingCaution(): ParagraphBlock {
  return {
    kind: 'paragraph',
    size: 'small',
    text: [
      { text: `${documentWords.standingCautionTitle}. `, bold: true },
      { text: documentWords.standingCaution },
    ],
  }
}
