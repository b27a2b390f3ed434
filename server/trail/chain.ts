import { createHash } from 'node:crypto';

/** One thing that changed: where, and what stood there before and after, in words. */
export interface TrailChange {
  readonly where: string;
  readonly before: string;
  readonly after: string;
}

/** An entry of a house's trail as it is sealed. */
export interface TrailEntry {
  readonly houseId: string;
  /** 1 for a house's first entry, then without a gap. */
  readonly place: number;
  /** UTC, to the millisecond, by the server's clock. */
  readonly at: string;
  /** `null` for the product itself: a seed, a job. */
  readonly actorId: string | null;
  readonly actor: string;
  readonly act: string;
  readonly subjectKind: string;
  readonly subjectId: string | null;
  readonly subject: string;
  readonly productId: string | null;
  readonly changes: readonly TrailChange[];
  /** SHA-256 of the whole record after the act, so that what words leave out is sealed too. */
  readonly recordHash: string | null;
  /** Seal of the entry before; of nothing for the first. */
  readonly hashBefore: string;
  readonly hash: string;
}

/** What the first entry of every house is chained to. */
export const BEGINNING = '0'.repeat(64);

/** JSON with sorted keys: the same text whichever way a database keeps it. */
export function canonicalJson(value: unknown): string {
  return JSON.stringify(value, (_key, part: unknown) =>
    typeof part === 'object' && part !== null && !Array.isArray(part) ? Object.fromEntries(Object.entries(part).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))) : part,
  );
}

/** SHA-256 of a value's canonical JSON, in hexadecimal. */
export function hashOf(value: unknown): string {
  return createHash('sha256').update(canonicalJson(value)).digest('hex');
}

/** Seals an entry to the one before it. */
export function seal(entry: Omit<TrailEntry, 'hash'>): TrailEntry {
  return { ...entry, hash: hashOf(entry) };
}

export type TrailVerdict =
  | { readonly isWhole: true; readonly entries: number; readonly head: string }
  | { readonly isWhole: false; readonly entries: number; readonly place: number; readonly why: string };

/**
 * Goes along one house's entries in order and says where the chain first breaks. A tail that
 * was cut off cannot be seen from what is left: give the number and seal of the last entry
 * known from an earlier export (`known`).
 */
export class TrailVerifier {
  private head = BEGINNING;
  private count = 0;
  private fault: { place: number; why: string } | null = null;

  constructor(
    private readonly houseId: string,
    private readonly known?: { readonly place: number; readonly hash: string },
  ) {}

  /** Takes the next entry; entries after the first fault are counted and no more. */
  take(entry: TrailEntry): void {
    this.count += 1;
    if (this.fault) return;
    const { hash, ...sealed } = entry;
    if (entry.houseId !== this.houseId) this.fail('belongs to another house');
    else if (entry.place !== this.count) this.fail(entry.place > this.count ? `is missing: entry ${entry.place} follows entry ${this.count - 1}` : 'stands here a second time or out of its order');
    else if (entry.hashBefore !== this.head) this.fail('is not chained to the entry before it');
    else if (hashOf(sealed) !== hash) this.fail('does not bear the seal of what it says');
    else if (this.known?.place === entry.place && this.known.hash !== hash) this.fail('is not the entry that the earlier export holds');
    this.head = hash;
  }

  /** What was found once every entry was taken. */
  finish(): TrailVerdict {
    if (!this.fault && this.known && this.known.place > this.count) this.fault = { place: this.count + 1, why: `is missing: an earlier export holds ${this.known.place} entries` };
    return this.fault ? { isWhole: false, entries: this.count, ...this.fault } : { isWhole: true, entries: this.count, head: this.head };
  }

  private fail(why: string): void {
    this.fault = { place: this.count, why };
  }
}
