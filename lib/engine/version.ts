/**
 * Version of the calculation, stored with every result so that a report can be computed again with the
 * rules it was made by. Raised whenever a number, a flag or a report text can come out differently.
 */
export const ENGINE_VERSION = '1.1.0';
