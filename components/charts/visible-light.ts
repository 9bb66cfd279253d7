export const VISIBLE_NM = { from: 380, to: 750 } as const;

/** One lobe of a colour matching function: a bell with its own width on each side. */
function lobe(nm: number, height: number, centre: number, left: number, right: number): number {
  const t = (nm - centre) / (nm < centre ? left : right);
  return height * Math.exp(-0.5 * t * t);
}

/**
 * The colour of light of one wavelength, as a screen can show it.
 *
 * The CIE 1931 colour matching functions as sums of bells, turned into sRGB; what lies outside sRGB is cut, and all is
 * scaled so that the ribbon is bright where the eye's own response is low.
 *
 * @param nm wavelength in nm
 * @returns r, g, b, each 0 to 255; black outside 380 to 750 nm
 * @source C. Wyman, P.-P. Sloan, P. Shirley, "Simple Analytic Approximations to the CIE XYZ Color Matching Functions",
 *         J. Computer Graphics Techniques 2 (2013) 1-11; IEC 61966-2-1 for sRGB
 */
export function visibleColour(nm: number): [number, number, number] {
  if (!(nm >= VISIBLE_NM.from && nm <= VISIBLE_NM.to)) return [0, 0, 0];
  // towards both ends the hue hardly changes, and the bells lose their ratio to each other
  const hue = Math.min(650, Math.max(420, nm));
  const x =
    lobe(hue, 1.056, 599.8, 37.9, 31) + lobe(hue, 0.362, 442, 16, 26.7) - lobe(hue, 0.065, 501.1, 20.4, 26.2);
  const y = lobe(hue, 0.821, 568.8, 46.9, 40.5) + lobe(hue, 0.286, 530.9, 16.3, 31.1);
  const z = lobe(hue, 1.217, 437, 11.8, 36) + lobe(hue, 0.681, 459, 26, 13.8);
  const linear = [
    3.2406 * x - 1.5372 * y - 0.4986 * z,
    -0.9689 * x + 1.8758 * y + 0.0415 * z,
    0.0557 * x - 0.204 * y + 1.057 * z,
  ].map((value) => Math.max(0, value));
  const brightest = Math.max(...linear);
  const brightness = 0.35 + 0.65 * Math.min(1, (nm - VISIBLE_NM.from) / 45, (VISIBLE_NM.to - nm) / 70);
  const [r = 0, g = 0, b = 0] = linear.map((value) =>
    Math.round(
      245 *
        brightness *
        (value / brightest <= 0.0031308 ? 0 : 1.055 * (value / brightest) ** (1 / 2.4) - 0.055),
    ),
  );
  return [r, g, b];
}

/** The ribbon between two wavelengths: where it starts and ends, and colours at fractions of that length. */
export function ribbonBetween(minNm: number, maxNm: number, stepNm = 10) {
  const from = Math.max(minNm, VISIBLE_NM.from);
  const to = Math.min(maxNm, VISIBLE_NM.to);
  if (!(to > from)) return null;
  const count = Math.max(2, Math.ceil((to - from) / stepNm) + 1);
  const stops = Array.from({ length: count }, (_, i) => {
    const offset = i / (count - 1);
    return { offset, colour: `rgb(${visibleColour(from + offset * (to - from)).join(',')})` };
  });
  return { from, to, stops };
}
