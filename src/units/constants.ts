/** m/s, exact. Source: SI brochure, 9th ed. 2019, definition of the metre. */
export const SPEED_OF_LIGHT = 299_792_458;

/** Equatorial radius (m) and flattening. Source: NIMA TR8350.2, 3rd ed. 2000, table 3.1 (WGS84). */
export const WGS84 = { equatorialRadiusM: 6_378_137, flattening: 1 / 298.257223563 } as const;

/** Mean sidereal day in seconds of UT1. Source: Explanatory Supplement to the Astronomical Almanac, 3rd ed. 2013, ch. 3. */
export const SIDEREAL_DAY_SECONDS = 86_164.0905;

/** Rate of the Earth rotation angle, rad per second of UT1. Source: IERS Conventions (2010), TN 36, eq. 5.15. */
export const EARTH_ROTATION_RAD_PER_S = (2 * Math.PI * 1.00273781191135448) / 86_400;

/** m, exact. Source: IAU 2012 resolution B2. */
export const ASTRONOMICAL_UNIT_M = 149_597_870_700;

/** m³/s², nominal gravitational parameter of the Sun. Source: IAU 2015 resolution B3. */
export const SOLAR_GM = 1.327_124_4e20;
