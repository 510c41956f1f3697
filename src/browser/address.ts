/** The building named in the page's address: `#building=<id>`. */

/** The address of a building's sheet. */
export function sheetAddress(id: string): string {
  return `#building=${encodeURIComponent(id)}`;
}

/** The identifier named in a fragment, or null. */
export function addressed(hash: string): string | null {
  const found = /^#building=(.+)$/.exec(hash);
  if (found === null) return null;
  try {
    return decodeURIComponent(found[1] ?? '');
  } catch {
    return null;
  }
}
