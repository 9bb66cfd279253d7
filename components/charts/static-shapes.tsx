import { cssColour } from './chart-colour';
import type { ChartDash, ChartModel, ChartRegion } from './chart-model';
import type { StaticScale } from './static-scale';
import { thinLine } from './thin-line';

interface Part {
  model: ChartModel;
  scale: StaticScale;
}

export const DASHES: Record<ChartDash, string | undefined> = {
  solid: undefined,
  dashed: '7 4',
  dashdot: '8 3 1.5 3',
  dotted: '1.5 3',
};

/** Where a region's sentence begins or ends: across, and its base line in px. */
function sentencePlace(region: ChartRegion, scale: StaticScale) {
  if (region.corner === 'top-left') return { x: '0%', dx: 6, y: 14, textAnchor: 'start' as const };
  const y = region.corner === 'edge-right' ? scale.y(region.from ?? 0) - 6 : scale.height - 7;
  return { x: '100%', dx: -6, y, textAnchor: 'end' as const };
}

/** The part of a region that lies within the axes, or null. */
function seenPart(region: ChartRegion, model: ChartModel) {
  const axis = region.axis === 'x' ? model.x : model.y;
  const from = Math.max(region.from ?? axis.min, axis.min);
  const to = Math.min(region.to ?? axis.max, axis.max);
  return to > from ? { from, to } : null;
}

/** The parts not to be trusted. */
export function StaticRegions({ model, scale }: Part) {
  return model.regions.map((region) => {
    const seen = seenPart(region, model);
    if (!seen) return null;
    const place =
      region.axis === 'x'
        ? { x: scale.x(seen.from), width: scale.width(seen.from, seen.to), y: 0, height: scale.height }
        : { x: 0, width: '100%', y: scale.y(seen.to), height: scale.y(seen.from) - scale.y(seen.to) };
    return (
      <rect
        key={region.id}
        {...place}
        className={region.tone === 'stop' ? 'fill-red-wash' : 'fill-amber-wash'}
      />
    );
  });
}

/** Why they are not to be trusted, above all lines. */
export function StaticSentences({ model, scale }: Part) {
  return model.regions
    .filter((region) => seenPart(region, model))
    .map((region) => (
      <text
        key={region.id}
        {...sentencePlace(region, scale)}
        className={
          region.tone === 'stop'
            ? 'fill-red stroke-red-wash font-sans'
            : 'fill-amber stroke-amber-wash font-sans'
        }
        paintOrder="stroke"
        strokeWidth="4"
        strokeLinejoin="round"
      >
        {region.sentence}
      </text>
    ));
}

/** Bands, guides, the marker and the lines, in a drawing that stretches across and is cut at the axes. */
export function StaticLines({ model, scale }: Part) {
  return (
    <>
      <svg
        viewBox="0 0 1000 1000"
        preserveAspectRatio="none"
        width="100%"
        height={scale.height}
        aria-hidden="true"
      >
        {model.bands.map((band) => (
          <path
            key={band.name}
            d={`${scale.path([...band.x, ...band.x.toReversed()], [...band.high, ...band.low.toReversed()])}Z`}
            fill={cssColour(band.colour)}
          />
        ))}
        {model.lines.map((line) => {
          const thin = thinLine(line.x, line.y);
          return (
            <path
              key={line.id}
              d={scale.path(thin.x, thin.y)}
              fill="none"
              stroke={cssColour(line.colour)}
              strokeWidth={line.width}
              strokeDasharray={DASHES[line.dash]}
              strokeLinejoin="round"
              vectorEffect="non-scaling-stroke"
            />
          );
        })}
      </svg>
      {model.guides.map((guide) => (
        <g key={guide.id} stroke={cssColour(guide.colour)} strokeDasharray="3 3">
          <line x1="0" x2={scale.x(guide.x)} y1={scale.y(guide.y)} y2={scale.y(guide.y)} />
          <line x1={scale.x(guide.x)} x2={scale.x(guide.x)} y1={scale.y(guide.y)} y2={scale.height} />
        </g>
      ))}
      {model.markers.map((marker) => (
        <g key={marker.x} className="fill-uv stroke-uv">
          <rect
            x={scale.x(marker.x - marker.halfWidth)}
            width={scale.width(0, 2 * marker.halfWidth)}
            y="0"
            height={scale.height}
            opacity="0.18"
            stroke="none"
          />
          <line x1={scale.x(marker.x)} x2={scale.x(marker.x)} y1="0" y2={scale.height} />
        </g>
      ))}
    </>
  );
}
