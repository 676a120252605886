/** A point on the ground in degrees on WGS84. */
export interface Place {
  readonly lat: number;
  readonly lon: number;
}

/** WGS84: the equator's radius in metres and the flattening (NGA.STND.0036, 2014). */
const EQUATOR_RADIUS = 6378137;
const FLATTENING = 1 / 298.257223563;
const POLE_RADIUS = EQUATOR_RADIUS * (1 - FLATTENING);
const toRadians = (degrees: number): number => (degrees * Math.PI) / 180;
const toDegrees = (radians: number): number => (radians * 180) / Math.PI;

/**
 * Metres along the WGS84 ellipsoid between two places, to about half a millimetre: T. Vincenty's inverse formula
 * (Survey Review 23/176, 1975), and for nearly opposite places, where it does not settle, the shortest way over a waypoint.
 */
export function distanceMeters(from: Place, to: Place): number {
  return vincentyMeters(from, to) ?? overWaypointMeters(from, to);
}

interface Sphere {
  readonly sinSigma: number;
  readonly cosSigma: number;
  readonly sigma: number;
  readonly cosSqAlpha: number;
  readonly sinAlpha: number;
  readonly cos2SigmaM: number;
}

/** U1, U2: reduced latitudes; lambda: difference of longitude on the auxiliary sphere; sigma: angular distance; alpha: azimuth at the equator. */
function onSphere(U1: number, U2: number, lambda: number): Sphere {
  const across = Math.cos(U2) * Math.sin(lambda);
  const along = Math.cos(U1) * Math.sin(U2) - Math.sin(U1) * Math.cos(U2) * Math.cos(lambda);
  const sinSigma = Math.hypot(across, along);
  const cosSigma = Math.sin(U1) * Math.sin(U2) + Math.cos(U1) * Math.cos(U2) * Math.cos(lambda);
  const sinAlpha = sinSigma === 0 ? 0 : (Math.cos(U1) * across) / sinSigma;
  const cosSqAlpha = 1 - sinAlpha * sinAlpha;
  const cos2SigmaM = cosSqAlpha < 1e-15 ? 0 : cosSigma - (2 * Math.sin(U1) * Math.sin(U2)) / cosSqAlpha; // on the equator: 0
  return { sinSigma, cosSigma, sigma: Math.atan2(sinSigma, cosSigma), cosSqAlpha, sinAlpha, cos2SigmaM };
}

function vincentyMeters(from: Place, to: Place): number | null {
  const f = FLATTENING;
  const L = toRadians(((((to.lon - from.lon) % 360) + 540) % 360) - 180);
  const U1 = Math.atan((1 - f) * Math.tan(toRadians(from.lat)));
  const U2 = Math.atan((1 - f) * Math.tan(toRadians(to.lat)));
  let lambda = L;
  for (let round = 0; round < 100; round++) {
    const s = onSphere(U1, U2, lambda);
    const C = (f / 16) * s.cosSqAlpha * (4 + f * (4 - 3 * s.cosSqAlpha));
    const inner = s.cos2SigmaM + C * s.cosSigma * (2 * s.cos2SigmaM ** 2 - 1);
    const next = L + (1 - C) * f * s.sinAlpha * (s.sigma + C * s.sinSigma * inner);
    if (Math.abs(next) > Math.PI) return null;
    if (Math.abs(next - lambda) < 1e-13) return metersOf(onSphere(U1, U2, next));
    lambda = next;
  }
  return null;
}

function metersOf({ sinSigma, cosSigma, sigma, cosSqAlpha, cos2SigmaM }: Sphere): number {
  const uSq = (cosSqAlpha * (EQUATOR_RADIUS ** 2 - POLE_RADIUS ** 2)) / POLE_RADIUS ** 2;
  const A = 1 + (uSq / 16384) * (4096 + uSq * (-768 + uSq * (320 - 175 * uSq)));
  const B = (uSq / 1024) * (256 + uSq * (-128 + uSq * (74 - 47 * uSq)));
  const last = (B / 6) * cos2SigmaM * (4 * sinSigma ** 2 - 3) * (4 * cos2SigmaM ** 2 - 3);
  const deltaSigma = B * sinSigma * (cos2SigmaM + (B / 4) * (cosSigma * (2 * cos2SigmaM ** 2 - 1) - last));
  return POLE_RADIUS * A * (sigma - deltaSigma);
}

/** A quarter of the way round a sphere from `from`, in direction `azimuth` (radians). */
function quarterWay(from: Place, azimuth: number): Place {
  const lat = Math.asin(Math.cos(toRadians(from.lat)) * Math.cos(azimuth));
  const lon = Math.atan2(Math.sin(azimuth), -Math.sin(toRadians(from.lat)) * Math.cos(azimuth));
  return { lat: toDegrees(lat), lon: from.lon + toDegrees(lon) };
}

/**
 * Every way to the far side crosses the circle a quarter of the way round, so the shortest way is the least sum of two legs
 * over a point of that circle. Both legs are far from opposite; the sum is flat at its least, so the waypoint need not be exact.
 */
function overWaypointMeters(from: Place, to: Place): number {
  const over = (azimuth: number): number => {
    const waypoint = quarterWay(from, azimuth);
    return (vincentyMeters(from, waypoint) ?? Infinity) + (vincentyMeters(waypoint, to) ?? Infinity);
  };
  const step = Math.PI / 90;
  const coarse = Array.from({ length: 180 }, (_, i) => i * step).reduce((best, azimuth) => (over(azimuth) < over(best) ? azimuth : best), 0);
  let [low, high] = [coarse - step, coarse + step];
  while (high - low > 1e-9) {
    const third = (high - low) / 3;
    if (over(low + third) < over(high - third)) high -= third;
    else low += third;
  }
  return over((low + high) / 2);
}
