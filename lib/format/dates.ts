/** A day as people write it, in the laboratory's zone: 1 December 2026. */
export function formatDate(iso: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone }).format(new Date(iso));
}

/** A moment to the second, in the laboratory's zone: 2026-12-01 14:05:09. Sorts as it reads. */
export function formatDateTime(iso: string, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('sv-SE', { dateStyle: 'short', timeStyle: 'medium', timeZone });
  return parts.format(new Date(iso));
}
