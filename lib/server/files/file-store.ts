import 'server-only';

/** Where bytes of photos and attachments are kept. Bytes are named by the id of their row in `files`. */
export interface FileStore {
  readonly kind: 'database' | 'bucket';
  /** Keeps bytes; putting the same again changes nothing. */
  put: (fileId: string, content: Uint8Array, mediaType: string) => Promise<void>;
  /** The bytes, or null where there are none. */
  get: (fileId: string) => Promise<Buffer | null>;
  /** Whether the bytes are there, without reading them. */
  has: (fileId: string) => Promise<boolean>;
  remove: (fileId: string) => Promise<void>;
}
