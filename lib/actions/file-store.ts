/** Where the bytes of pictures and documents lie. Keys are ours: random, and nothing of what a person typed. */
export type FileStore = {
  put(key: string, bytes: Buffer, contentType: string): Promise<void>;
  /** The bytes of a key; null when there are none. */
  get(key: string): Promise<Buffer | null>;
  delete(keys: readonly string[]): Promise<void>;
  /** Every key that was stored before an instant. */
  listBefore(before: Date): AsyncIterable<string[]>;
};

/** A file as it is kept: turned upright, stripped of what it tells beside its picture, with a small one of it. */
export type PreparedFile = {
  kind: 'picture' | 'document';
  contentType: string;
  bytes: Buffer;
  thumb: Buffer | null;
  width: number | null;
  height: number | null;
};

/** Looks into a file and makes it fit to keep. Throws `invalid_input` or `too_large` on `file`. */
export type PrepareFile = (bytes: Buffer) => Promise<PreparedFile>;
