/** A new id for a part of a case (a level, a dose line): 64 random bits in hex. `crypto.randomUUID` is missing on plain http. */
export function partId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(8));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");
}
