import { randomUUID } from 'node:crypto';
import { AppError } from '#server/http/app-error.ts';
import { FileAnswer } from '#server/http/file-answer.ts';
import type { Actor } from '#server/http/session.ts';
import type { Paper } from './read-paper.ts';
import type { ObjectStore } from './object-store.ts';

/** What papers need of the object store. */
export type PaperStore = Pick<ObjectStore, 'putObject' | 'getObject' | 'deleteObject'>;

/** Our own key: nothing of the user's naming reaches the store. */
export function newPaperKey(actor: Actor, shelf: 'materials' | 'evidence' | 'pictures'): string {
  return `houses/${actor.houseId}/${shelf}/${randomUUID()}`;
}

/** What is noted of every paper, whatever it belongs to. */
export function noteOf(paper: Paper, { actor, storageKey, dated, now }: { readonly actor: Actor; readonly storageKey: string; readonly dated?: string | undefined; readonly now: Date }) {
  const { fileName, mediaType, bytes, sha256 } = paper;
  return { fileName, mediaType, bytes: bytes.length, sha256, storageKey, dated: dated ?? null, addedAt: now, addedById: actor.personId, addedBy: actor.name };
}

/** Bytes first, then the row that `note` writes: a paper that is listed can always be fetched. */
export async function storePaper<T>(store: PaperStore, paper: Paper, storageKey: string, note: () => Promise<T>): Promise<T> {
  await store.putObject(storageKey, paper.bytes, paper.mediaType);
  try {
    return await note();
  } catch (error) {
    await dropPaper(store, storageKey);
    throw error;
  }
}

/** The bytes of a paper. @throws AppError `unavailable`, in the words given, where the store has lost them */
export async function fetchPaper(store: PaperStore, row: { readonly storageKey: string; readonly mediaType: string; readonly fileName: string }, lost: string): Promise<FileAnswer> {
  const stored = await store.getObject(row.storageKey);
  if (!stored) throw new AppError('unavailable', { message: lost });
  return new FileAnswer({ bytes: stored.bytes, mediaType: row.mediaType, fileName: row.fileName });
}

/** Once the row is gone for good: bytes that stay behind because the store is away are reachable by nobody. */
export async function dropPaper(store: PaperStore, storageKey: string): Promise<void> {
  await store.deleteObject(storageKey).catch(() => undefined);
}
