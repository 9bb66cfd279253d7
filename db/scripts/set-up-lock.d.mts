export function withLock<T>(
  file: string,
  work: () => Promise<T>,
  options?: { readonly onWait?: () => void; readonly staleMs?: number; readonly pollMs?: number },
): Promise<T>;
