import { MARGIN } from './chart-model';

/** The chosen wavelength, under the axis it belongs to: for the keyboard, for fingers, and before the plot is loaded. */
export function WavelengthSlider({
  min,
  max,
  step,
  value,
  onPick,
}: {
  min: number;
  max: number;
  step: number;
  value?: number;
  onPick: (nm: number) => void;
}) {
  return (
    // half a thumb more on both sides, so that the thumb's middle stands under its wavelength
    <div className="no-print" style={{ paddingLeft: MARGIN.left - 8, paddingRight: MARGIN.right - 8 }}>
      <input
        type="range"
        aria-label="Wavelength to read at"
        aria-valuetext={value === undefined ? 'none chosen' : `${value} nm`}
        min={min}
        max={max}
        step={step}
        value={value ?? (min + max) / 2}
        onChange={(event) => onPick(Number(event.currentTarget.value))}
        className="axis-slider block h-6 w-full"
      />
    </div>
  );
}
