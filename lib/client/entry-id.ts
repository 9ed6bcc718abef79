/** A random UUID (version 4), also where a page is served without TLS and `crypto.randomUUID` is missing. */
export function makeId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(16));
  bytes[6] = (bytes[6]! & 0x0f) | 0x40;
  bytes[8] = (bytes[8]! & 0x3f) | 0x80;
  const hex = [...bytes].map((byte) => byte.toString(16).padStart(2, '0')).join('');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}

/**
 * The id of an entry that is being written, the same for as long as the entry is: a double tap, a lost reply and a
 * reload all send one id. `what` names the entry by what it starts from, so that the next one gets an id of its own.
 */
export function entryId(what: string): string {
  const key = `entry:${what}`;
  const kept = sessionStorage.getItem(key);
  if (kept) return kept;
  const made = makeId();
  sessionStorage.setItem(key, made);
  return made;
}

/** Forgets the id of an entry that was answered. */
export function forgetEntry(what: string): void {
  sessionStorage.removeItem(`entry:${what}`);
}
