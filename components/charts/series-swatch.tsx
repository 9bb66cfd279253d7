import { cssColour } from './chart-colour';
import type { SpectrumLook } from './spectrum-look';
import { DASHES } from './static-shapes';

/** A short piece of a line as the plot draws it, for the table beside it. */
export function SeriesSwatch({ look }: { look: SpectrumLook }) {
  return (
    <svg width="18" height="8" aria-hidden="true" className="mr-2 inline-block shrink-0 align-middle">
      <line
        x1="0"
        x2="18"
        y1="4"
        y2="4"
        strokeWidth="2.5"
        stroke={cssColour(look.colour)}
        strokeDasharray={DASHES[look.dash]}
      />
    </svg>
  );
}
