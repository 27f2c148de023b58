/* Wetted area of vessels, by exact geometry: cylinders with ellipsoidal, hemispherical or flat heads, and spheres. */
import { integrate } from '../../numeric';

/** The head kinds that are worked: 2:1 ellipsoidal (depth D/4), hemispherical (depth D/2), flat. */
export const HEADS = ['ellipsoidal', 'hemispherical', 'flat'] as const;

/** A head kind. */
export type Heads = (typeof HEADS)[number];

/** The shapes that are worked. */
export const ORIENTATIONS = ['horizontal', 'vertical', 'sphere'] as const;

/** A shape. */
export type Orientation = (typeof ORIENTATIONS)[number];

/** A vessel in metres; `L` tangent to tangent, heights from the lowest inside point. */
export type Vessel = { orientation: Orientation; D: number; L: number; heads: Heads };

/** Depth of one head in metres. */
export function headDepth(heads: Heads, D: number): number {
  return { ellipsoidal: D / 4, hemispherical: D / 2, flat: 0 }[heads];
}

/** Inside height of the vessel, from its lowest to its highest inside point, metres. */
export function vesselHeight(v: Vessel): number {
  return v.orientation === 'vertical' ? v.L + 2 * headDepth(v.heads, v.D) : v.D;
}

/** Length of a meridian element of a head of radius R and depth b at the angle t from its pole. */
const meridian = (R: number, b: number, t: number): number => Math.hypot(R * Math.cos(t), b * Math.sin(t));

/** Surface of a head of radius R and depth b from its pole to the height h along its axis (0 ≤ h ≤ b). */
function poleCap(R: number, b: number, h: number): number {
  const end = Math.acos(Math.max(-1, 1 - h / b));
  return integrate((t) => 2 * Math.PI * R * Math.sin(t) * meridian(R, b, t), 0, end);
}

/** Share of a circle of radius r that lies below a line at the height y over its centre. */
function shareBelow(r: number, y: number): number {
  if (y >= r) return 1;
  if (y <= -r) return 0;
  return 1 - Math.acos(y / r) / Math.PI;
}

/** Surface of one head with a horizontal axis that lies below the level h (0 ≤ h ≤ 2R). */
function sideHead(heads: Heads, R: number, h: number): number {
  const y = h - R;
  if (heads === 'flat') return R * R * Math.acos(-y / R) + y * Math.sqrt(Math.max(0, R * R - y * y));
  const b = headDepth(heads, 2 * R);
  const bend = Math.asin(Math.min(1, Math.abs(y) / R));
  const density = (t: number) =>
    2 * Math.PI * R * Math.sin(t) * meridian(R, b, t) * shareBelow(R * Math.sin(t), y);
  return integrate(density, 0, bend) + integrate(density, bend, Math.PI / 2);
}

/** Wetted surface of the shell and of the heads, m²; of a sphere all is shell. */
export type Wetted = { shell: number; heads: number };

function horizontalArea(v: Vessel, h: number): Wetted {
  const R = v.D / 2;
  return { shell: v.D * Math.acos(1 - h / R) * v.L, heads: 2 * sideHead(v.heads, R, h) };
}

/** Bottom head, shell and, where the liquid reaches it, top head. A flat bottom counts as exposed. */
function verticalArea(v: Vessel, h: number): Wetted {
  if (h <= 0) return { shell: 0, heads: 0 };
  const R = v.D / 2;
  const b = headDepth(v.heads, v.D);
  const shell = Math.PI * v.D * Math.min(Math.max(h - b, 0), v.L);
  if (v.heads === 'flat') return { shell, heads: Math.PI * R * R * (h >= v.L ? 2 : 1) };
  const whole = poleCap(R, b, b);
  const bottom = h >= b ? whole : poleCap(R, b, h);
  const above = h - b - v.L;
  const top = above <= 0 ? 0 : whole - poleCap(R, b, Math.max(0, b - above));
  return { shell, heads: bottom + top };
}

/**
 * Inside surface that is wetted up to the height `h` over the lowest inside point, m², shell and heads apart. `h` is held
 * between 0 and the vessel's height. Exact geometry (quadrature for heads); API 521 counts both heads of a horizontal vessel.
 */
export function wettedParts(v: Vessel, h: number): Wetted {
  const height = Math.min(Math.max(h, 0), vesselHeight(v));
  if (v.orientation === 'sphere') return { shell: Math.PI * v.D * height, heads: 0 };
  return v.orientation === 'horizontal' ? horizontalArea(v, height) : verticalArea(v, height);
}

/** Inside surface that is wetted up to the height `h`, m²: shell and heads together. */
export function wettedArea(v: Vessel, h: number): number {
  const { shell, heads } = wettedParts(v, h);
  return shell + heads;
}

/**
 * The wetted height that counts in a pool fire: the liquid level, but not above the fire height; for a sphere not
 * above the greater of its equator and the fire height (API 521, from memory). Metres; 0 when the fire does not reach.
 */
export function effectiveHeight(
  v: Vessel,
  place: { level: number; elevation: number; fireHeight: number },
): number {
  const reach = Math.max(0, place.fireHeight - place.elevation);
  const cap = v.orientation === 'sphere' ? Math.max(v.D / 2, reach) : reach;
  return Math.max(0, Math.min(place.level, cap));
}
