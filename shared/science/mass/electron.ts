/** Mass of the electron in u (CODATA 2022). */
export const ELECTRON_MASS = 5.485799090441e-4
