/** Elliptical Gaussian: flux density (Jy), FWHM axes (rad), position angle of the major axis north through east (rad), offset east l and north m (rad). */
export type GaussianComponent = {
  fluxJy: number;
  majorRad: number;
  minorRad: number;
  positionAngleRad: number;
  eastRad: number;
  northRad: number;
};
