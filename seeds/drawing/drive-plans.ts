import { around, figure } from './geometry.js';
import { Sheet, ink, type Point } from './sheet.js';

/** Outline of a spur gear as a path: trapezoid teeth between root and tip circle, enough for a plan. */
function gearPath(
  centre: Point,
  teeth: number,
  pitchRadius: number,
  modulePixels: number,
  phase: number,
): string {
  const points: Point[] = [];
  const step = 360 / teeth;
  for (let tooth = 0; tooth < teeth; tooth++) {
    const start = phase + tooth * step;
    const root = pitchRadius - 1.2 * modulePixels;
    const tip = pitchRadius + modulePixels;
    points.push(
      around(centre, root, start - step * 0.32),
      around(centre, tip, start - step * 0.12),
      around(centre, tip, start + step * 0.12),
      around(centre, root, start + step * 0.32),
    );
  }
  return `M${points.map(([x, y]) => `${x.toFixed(1)} ${y.toFixed(1)}`).join('L')}Z`;
}

export interface Mesh {
  readonly title: string;
  readonly ring: string;
  readonly pinion: string;
  readonly ringTeeth: number;
  readonly pinionTeeth: number;
  /** Gear module, mm. */
  readonly module: number;
  /** Centre distance as found, mm; the drawing tells how far it is from the standard one. */
  readonly centres: number;
  /** An obstruction on the ring's rim: a clamp screw head at this angle (degrees, anticlockwise from the pinion) and reach beyond the tip circle (mm). */
  readonly screw?: { readonly angle: number; readonly reach: number };
}

/** Plan of a ring gear and its pinion at the measured centre distance. */
export function meshPlan(mesh: Mesh): string {
  const sheet = new Sheet(mesh.title, 'PLAN · TEETH DRAWN AS TRAPEZIA · DIMENSIONS IN mm');
  const standard = (mesh.module * (mesh.ringTeeth + mesh.pinionTeeth)) / 2;
  const scale = 226 / standard;
  const modulePixels = mesh.module * scale;
  const ring: Point = [340, 280];
  const pinion: Point = [340 + mesh.centres * scale, 280];
  const ringRadius = (mesh.module * mesh.ringTeeth * scale) / 2;
  const pinionRadius = (mesh.module * mesh.pinionTeeth * scale) / 2;
  sheet.path(gearPath(ring, mesh.ringTeeth, ringRadius, modulePixels, 0), 'outline', 'none');
  sheet.circle(ring, ringRadius * 0.82, 'outline', 'steel').circle(ring, ringRadius * 0.7, 'outline', 'none');
  sheet
    .path(
      gearPath(pinion, mesh.pinionTeeth, pinionRadius, modulePixels, 180 + 180 / mesh.pinionTeeth),
      'outline',
      'none',
    )
    .circle(pinion, pinionRadius * 0.32);
  sheet
    .circle(ring, ringRadius, 'axis')
    .circle(pinion, pinionRadius, 'axis')
    .centre(ring, ringRadius + 34)
    .centre(pinion, pinionRadius + 24);
  const off = mesh.centres - standard;
  sheet.across(ring[0], pinion[0], 536, `CENTRES ${figure(mesh.centres, 2)}`, 280);
  sheet.text(48, 580, `STANDARD CENTRES ${figure(standard, 2)}`, { height: 13 });
  if (Math.abs(off) > 0.01) {
    sheet.text(
      48,
      604,
      off > 0 ? `${figure(off, 2)} TOO FAR APART: PLAY` : `${figure(-off, 2)} TOO CLOSE: TIPS BOTTOM`,
      { colour: ink.red, height: 13 },
    );
  }
  sheet.label(around(ring, ringRadius * 0.76, 40), [640, 110], `${mesh.ring} ${mesh.ringTeeth} TEETH`);
  sheet.label(
    [pinion[0], pinion[1] + pinionRadius * 0.6],
    [700, 440],
    `${mesh.pinion} ${mesh.pinionTeeth} TEETH`,
  );
  if (mesh.screw) {
    const radius = ringRadius + modulePixels + (mesh.screw.reach * scale) / 2;
    const head = around(ring, radius, mesh.screw.angle);
    sheet.circle(head, Math.max(11, (mesh.screw.reach * scale) / 2 + 6), 'red', 'none');
    sheet.clash([around(head, 14, 45), around(head, 14, 135), around(head, 14, 225), around(head, 14, 315)]);
    sheet.label(head, [700, 170], `CLAMP SCREW AT ${mesh.screw.angle}°`, ink.red);
  }
  return sheet.toSvg();
}

export interface BeltRun {
  readonly title: string;
  readonly bigTeeth: number;
  readonly smallTeeth: number;
  /** Belt pitch, mm. */
  readonly pitch: number;
  readonly centres: number;
  /** Idler position along the span, 0 at the small pulley to 1 at the big one, and how far it presses in, mm. */
  readonly idler?: { readonly along: number; readonly press: number; readonly side: 'slack' | 'tight' };
  readonly slotTravel?: number;
}

/** Plan of a toothed belt over two pulleys with its tensioner. */
export function beltPlan(run: BeltRun): string {
  const sheet = new Sheet(run.title, 'PLAN FROM THE CAMERA END · DIMENSIONS IN mm');
  const scale = 380 / run.centres;
  const big: Point = [300, 280];
  const small: Point = [300 + run.centres * scale, 280];
  const bigRadius = Math.min(158, ((run.pitch * run.bigTeeth) / (2 * Math.PI)) * scale);
  const smallRadius = Math.max(24, ((run.pitch * run.smallTeeth) / (2 * Math.PI)) * scale);
  const lean = (Math.asin((bigRadius - smallRadius) / (run.centres * scale)) * 180) / Math.PI;
  sheet
    .circle(big, bigRadius, 'outline', 'steel')
    .circle(big, bigRadius * 0.78, 'outline', 'none')
    .circle(small, smallRadius, 'outline', 'steel')
    .circle(small, 9, 'outline', 'none');
  sheet.centre(big, bigRadius + 30).centre(small, smallRadius + 30);
  const upper: [Point, Point] = [
    around(big, bigRadius + 5, 90 - lean),
    around(small, smallRadius + 5, 90 - lean),
  ];
  const lower: [Point, Point] = [
    around(big, bigRadius + 5, -90 + lean),
    around(small, smallRadius + 5, -90 + lean),
  ];
  if (run.idler) {
    const span = run.idler.side === 'slack' ? lower : upper;
    const sign = run.idler.side === 'slack' ? -1 : 1;
    const along = run.idler.along;
    const at: Point = [
      span[1][0] + (span[0][0] - span[1][0]) * along,
      span[1][1] + (span[0][1] - span[1][1]) * along + sign * run.idler.press * scale,
    ];
    sheet.line(span[1], at).line(at, span[0]);
    sheet.circle([at[0], at[1] - sign * 18], 17, 'outline', 'shim');
    sheet.label(
      [at[0], at[1] - sign * 18],
      [at[0] + 60, sign > 0 ? 120 : 440],
      `IDLER ON THE ${run.idler.side.toUpperCase()} SIDE`,
      ink.brass,
    );
    const other = run.idler.side === 'slack' ? upper : lower;
    sheet.line(other[0], other[1]);
  } else sheet.line(upper[0], upper[1]).line(lower[0], lower[1]);
  sheet
    .path(arc(big, bigRadius + 5, 90 - lean, 270 + lean))
    .path(arc(small, smallRadius + 5, -90 + lean, 90 - lean));
  sheet.across(big[0], small[0], 500, `CENTRES ${figure(run.centres)}`, [big[1] + 20, small[1] + 20]);
  const wrap = 180 - 2 * lean;
  sheet.text(
    48,
    62,
    `WRAP ON THE SMALL PULLEY ${figure(wrap, 0)}° · ${figure((run.smallTeeth * wrap) / 360, 1)} TEETH CARRY`,
    { height: 13 },
  );
  sheet
    .label(around(big, bigRadius * 0.88, 150), [110, 110], `${run.bigTeeth} TEETH`)
    .label([small[0], small[1] - smallRadius * 0.7], [small[0] + 50, 150], `${run.smallTeeth} TEETH`);
  if (run.slotTravel !== undefined) {
    sheet.path(
      `M${small[0] - 34} ${small[1] + smallRadius + 34}h68a9 9 0 0 1 0 18h-68a9 9 0 0 1 0 -18Z`,
      'outline',
      'none',
    );
    sheet.label(
      [small[0], small[1] + smallRadius + 43],
      [small[0] + 60, 396],
      `SLOT TRAVEL ${figure(run.slotTravel)}`,
    );
  }
  return sheet.toSvg();
}

const arc = (centre: Point, radius: number, from: number, to: number): string => {
  const start = around(centre, radius, from);
  const end = around(centre, radius, to);
  return `M${start[0].toFixed(1)} ${start[1].toFixed(1)}A${radius.toFixed(1)} ${radius.toFixed(1)} 0 ${to - from > 180 ? 1 : 0} 0 ${end[0].toFixed(1)} ${end[1].toFixed(1)}`;
};
