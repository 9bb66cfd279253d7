import { jcamp } from './sources/jcamp';
import { light } from './sources/light';
import { publishedLines } from './sources/lines';
import { nistStrd } from './sources/nist-strd';
import { statistics } from './sources/statistics';
import type { CheckSource } from './types';

/**
 * The published values the calculation is checked against, by source. Made anew at every call: within one call the
 * checks of a source share their curve, and nothing of an earlier run is kept.
 */
export function publishedChecks(): readonly CheckSource[] {
  return [...nistStrd(), ...publishedLines(), ...statistics(), ...light(), jcamp()];
}
