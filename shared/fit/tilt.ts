/** An angle as both are read on the bench. */
export interface Tilt {
  readonly degrees: number;
  readonly arcMinutes: number;
}

/**
 * Tilt of a plate that stands off by `height` and rests `length` further on, asin(height / length).
 * Both in mm, length > 0; a height beyond the length cannot tilt further than 90°.
 */
export function tiltOf(height: number, length: number): Tilt {
  const degrees = (Math.asin(Math.min(1, Math.max(0, height / length))) * 180) / Math.PI;
  return { degrees, arcMinutes: degrees * 60 };
}

/** How far a gear or pulley of face width `width` (mm) runs out of plane at a tilt, mm: width · sin(tilt). */
export function outOfPlane(width: number, tilt: Tilt): number {
  return width * Math.sin((tilt.degrees * Math.PI) / 180);
}
