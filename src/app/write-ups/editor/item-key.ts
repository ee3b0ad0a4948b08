/** A new identity for a fix, step or reading: 24 characters that nothing else on this site has. */
export function newItemKey(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(12));
  return Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
}
