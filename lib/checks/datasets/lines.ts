/** Cadmium released by ceramic ware, five standards read three times each: mg/L and absorbance. */
export const CADMIUM = {
  x: [0.1, 0.1, 0.1, 0.3, 0.3, 0.3, 0.5, 0.5, 0.5, 0.7, 0.7, 0.7, 0.9, 0.9, 0.9],
  y: [0.028, 0.029, 0.029, 0.084, 0.083, 0.081, 0.135, 0.131, 0.133, 0.18, 0.181, 0.183, 0.215, 0.23, 0.216],
  sample: [0.0712, 0.0716],
};

/** Fluorescein: ng/mL and intensity. */
export const FLUORESCEIN = { x: [0, 2, 4, 6, 8, 10, 12], y: [2.1, 5, 9, 12.6, 17.3, 21, 24.7] };

/** Absorbances with the standard deviation of each level. */
export const WEIGHTED = {
  x: [0, 2, 4, 6, 8, 10],
  y: [0.009, 0.158, 0.301, 0.472, 0.577, 0.739],
  s: [0.001, 0.004, 0.01, 0.013, 0.017, 0.022],
};

/** A thermometer against a reference one. */
export const THERMOMETER = {
  x: [96, 98, 100, 102, 104, 106, 108, 110],
  y: [95.71, 98.16, 99.52, 102.09, 103.79, 106.18, 108.14, 110.21],
};
