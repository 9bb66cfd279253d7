import { hatchLines, lightWords, litPath } from './light-disc-path';

/**
 * How much light got through, as a moon: the lit area is T = 10^−A of the absorbance as it was read, before blank
 * and path length. Below zero it is full with a mark on its rim; without a reading it is hatched.
 */
export function LightDisc({
  absorbance,
  reason,
  size = 16,
  silent = false,
  className,
}: {
  /** A as read; null for a gap */
  absorbance: number | null;
  /** why there is no reading */
  reason?: string;
  size?: number;
  /** true where the same words already stand beside it */
  silent?: boolean;
  className?: string;
}) {
  const radius = 7;
  const gap = absorbance === null || Number.isNaN(absorbance);
  const words = lightWords(absorbance, reason);
  const named = silent ? { 'aria-hidden': true } : { role: 'img', 'aria-label': words };
  return (
    <svg
      width={size}
      height={size}
      viewBox="-8.5 -8.5 17 17"
      className={`inline-block shrink-0 align-[-0.2em]${className ? ` ${className}` : ''}`}
      {...named}
    >
      {!silent && <title>{words}</title>}
      {gap ? (
        hatchLines(radius).map((line, index) => (
          <line key={index} {...line} className="stroke-disc-rim" strokeWidth="1.1" />
        ))
      ) : (
        <>
          <circle r={radius} className="fill-disc-shadow" />
          <path d={litPath(10 ** -absorbance, radius)} className="fill-moon" />
        </>
      )}
      <circle r={radius} fill="none" className="stroke-disc-rim" strokeWidth="0.9" />
      {!gap && absorbance < 0 && (
        <path d="M3.2 -4.4 8.2 -7.6 6.6 -1.6Z" className="fill-red stroke-sheet" strokeWidth="0.6" />
      )}
    </svg>
  );
}
