/** The time zones this JavaScript knows, by IANA name, UTC first. */
export function timeZones(): string[] {
  return ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')];
}

export function isTimeZone(name: string): boolean {
  return timeZones().includes(name);
}

/** The zone of the computer this runs on, under a name of the list; UTC where it has none. */
export function ownTimeZone(): string {
  const own = Intl.DateTimeFormat().resolvedOptions().timeZone;
  return isTimeZone(own) ? own : 'UTC';
}
