import type { Db } from '../../platform/database/db.ts'
import { SignedText } from './signed-text.entity.ts'

export function readSignedText(db: Db, id: string): Promise<SignedText | null> {
  return db.getRepository(SignedText).findOneBy({ id })
}

/** Every signature under a record, the oldest first. */
export function readSignedTexts(db: Db, subjectKind: string, subjectId: string): Promise<SignedText[]> {
  return db.getRepository(SignedText).find({ where: { subjectKind, subjectId }, order: { signedAt: 'ASC' } })
}
