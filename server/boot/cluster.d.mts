/** A running cluster of the product's own. */
export interface Cluster {
  readonly port: number;
  readonly pid: number;
  readonly version: number;
  /** The data folder. */
  readonly data: string;
  /** Superuser, database `postgres`. Never given to the product. */
  readonly adminUrl: string;
  /** Role that owns the database `colophon`; migrations run as it. */
  readonly ownerUrl: string;
  /** The product's role: row-level security holds for it. */
  readonly appUrl: string;
  /** Settles when the server has ended, for whatever reason. */
  readonly ended: Promise<void>;
  /** After it ended by itself: a sentence for the reader. */
  why(): string;
  /** Stops the server in order; resolves when it is gone. */
  stop(): Promise<void>;
}
export const DATABASE: string;
export const ADMIN: string;
export const OWNER: string;
export const APP: string;
/** Makes the cluster of `home` when there is none, recovers what a killed start left, and starts it.
 * @throws Stop with a sentence for the reader */
export function openCluster(options: {
  home: string;
  say?: (line: string) => void;
  /** Port to use when it is free; else the remembered one, else any. */
  port?: number;
  /** PostgreSQL settings for this run only. */
  settings?: Record<string, string>;
  /** Gives up starting. */
  signal?: AbortSignal;
}): Promise<Cluster>;
/** Asks a server process to stop fast, then insists. */
export function stopServer(pid: number): Promise<void>;
