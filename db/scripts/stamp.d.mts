export const BUILD_SOURCES: readonly string[];
export function stampOf(root: string, sources: readonly string[]): Promise<string>;
export function buildStamp(root: string): Promise<string>;
export function installStamp(
  root: string,
  node?: {
    readonly versions: { readonly modules: string };
    readonly platform: string;
    readonly arch: string;
  },
): Promise<string>;
interface LockEntry {
  readonly version?: string;
  readonly integrity?: string;
  readonly optional?: boolean;
}
interface Lock {
  readonly packages: Readonly<Record<string, LockEntry>>;
}
export function installedIsLocked(lock: Lock, installed: Lock): boolean;
