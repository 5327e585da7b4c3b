import type { Actor } from '../../platform/http/request-context.ts'

/** Whether somebody may read a record, and so its papers, though no role of theirs opens it: because it is their own. */
export type ReadsOwn = (parentId: string, actor: Actor) => Promise<boolean>

/** Who reads the papers of a record besides those whose role opens it: said by the feature whose record it is. */
export function createOwnReaders() {
  const readers = new Map<string, ReadsOwn>()
  return {
    alsoReads(parentKind: string, reads: ReadsOwn): void {
      readers.set(parentKind, reads)
    },
    mayRead: async (parentKind: string, parentId: string, actor: Actor): Promise<boolean> =>
      (await readers.get(parentKind)?.(parentId, actor)) ?? false,
  }
}
