import { LIMITS } from '@/lib/limits';

/** Files up to this size have their hash checked whenever their page is opened; larger ones when downloaded. */
export const CHECKED_ON_PAGE_BYTES = LIMITS.fileBytes / 20;

interface ReadBy {
  readonly reader: string;
  readonly readerVersion: string;
  readonly dialect: string;
}

/** By what and as what a file was read. */
export function readerFacts({ reader, readerVersion, dialect }: ReadBy): { label: string; value: string }[] {
  return [
    { label: 'Understood as', value: dialect },
    { label: 'Reader', value: `${reader}, version ${readerVersion}` },
  ];
}
