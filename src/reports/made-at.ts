/** When a run was made, for people. */

/** "2026-06-11 09:30 UTC" from an ISO 8601 instant; other texts as they are. */
export function madeAt(iso: string): string {
  const found = /^(\d{4}-\d{2}-\d{2})T(\d{2}:\d{2})(?::[\d.]+)?Z$/.exec(iso);
  return found === null ? iso : `${found[1] ?? ''} ${found[2] ?? ''} UTC`;
}
