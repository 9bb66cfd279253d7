export function findChromium(
  env?: Readonly<Record<string, string | undefined>>,
  places?: readonly string[],
): string | null;
export function ensureChromium(): string;
