import { insertOnce } from '../../platform/database/rows.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import { DocumentPrint, DocumentRecord, DocumentVoid } from './document.entity.ts'

export function insertDocument(tx: Tx, row: DocumentRecord): Promise<{ created: boolean }> {
  return insertOnce(tx, DocumentRecord, row, [
    'parentKind',
    'parentId',
    'title',
    'kind',
    'fileName',
    'sha256',
  ])
}

export function findDocument(tx: Tx, id: string): Promise<DocumentRecord | null> {
  return tx.manager.findOneBy(DocumentRecord, { id })
}

export function isVoided(tx: Tx, documentId: string): Promise<boolean> {
  return tx.manager.existsBy(DocumentVoid, { documentId })
}

export async function insertDocumentVoid(tx: Tx, row: DocumentVoid): Promise<void> {
  await tx.manager.insert(DocumentVoid, row)
}

export async function insertPrint(tx: Tx, row: DocumentPrint): Promise<void> {
  await tx.manager.insert(DocumentPrint, row)
}
