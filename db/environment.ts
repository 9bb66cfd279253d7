import { parseEnv, type Env } from '@/lib/env';

let parsed: Env | undefined;

/** The configuration, read from the process once. */
export function environment(): Env {
  parsed ??= parseEnv(process.env);
  return parsed;
}
