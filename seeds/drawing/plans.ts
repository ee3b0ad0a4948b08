import { Sheet, ink, type Point } from './sheet.js';

const figure = (value: number, digits = 1): string => value.toFixed(digits);
const around = (centre: Point, radius: number, degrees: number): Point => [
  centre[0] + radius * Math.cos((degrees * Math.PI) / 180),
  centre[1] - radius * Math.sin((degrees * Math.PI) / 180),
];

/** Outline of a spur gear as a path: trapezoid teeth between root and tip circle, enough for a plan. */
function gearPath(centre: Point, teeth: number, pitchRadius: number, modulePixels: number, phase: number): string {
  const points: Point[] = [];
  const step = 360 / teeth;
  for (let tooth = 0; tooth < teeth; tooth++) {
    const start = phase + tooth * step;
    const root = pitchRadius - 1.2 * modulePixels;
    const tip = pitchRadius + modulePixels;
    points.push(around(centre, root, start - step * 0.32), around(centre, tip, start - step * 0.12), around(centre, tip, start + step * 0.12), around(centre, root, start + step * 0.32));
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
  sheet.path(gearPath(pinion, mesh.pinionTeeth, pinionRadius, modulePixels, 180 + 180 / mesh.pinionTeeth), 'outline', 'none').circle(pinion, pinionRadius * 0.32);
  sheet.circle(ring, ringRadius, 'axis').circle(pinion, pinionRadius, 'axis').centre(ring, ringRadius + 34).centre(pinion, pinionRadius + 24);
  const off = mesh.centres - standard;
  sheet.across(ring[0], pinion[0], 536, `CENTRES ${figure(mesh.centres, 2)}`, 280);
  sheet.text(48, 580, `STANDARD CENTRES ${figure(standard, 2)}`, { height: 13 });
  if (Math.abs(off) > 0.01) {
    sheet.text(48, 604, off > 0 ? `${figure(off, 2)} TOO FAR APART: PLAY` : `${figure(-off, 2)} TOO CLOSE: TIPS BOTTOM`, { colour: ink.red, height: 13 });
  }
  sheet.label(around(ring, ringRadius * 0.76, 40), [640, 110], `${mesh.ring} ${mesh.ringTeeth} TEETH`);
  sheet.label([pinion[0], pinion[1] + pinionRadius * 0.6], [700, 440], `${mesh.pinion} ${mesh.pinionTeeth} TEETH`);
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
  sheet.circle(big, bigRadius, 'outline', 'steel').circle(big, bigRadius * 0.78, 'outline', 'none').circle(small, smallRadius, 'outline', 'steel').circle(small, 9, 'outline', 'none');
  sheet.centre(big, bigRadius + 30).centre(small, smallRadius + 30);
  const upper: [Point, Point] = [around(big, bigRadius + 5, 90 - lean), around(small, smallRadius + 5, 90 - lean)];
  const lower: [Point, Point] = [around(big, bigRadius + 5, -90 + lean), around(small, smallRadius + 5, -90 + lean)];
  if (run.idler) {
    const span = run.idler.side === 'slack' ? lower : upper;
    const sign = run.idler.side === 'slack' ? -1 : 1;
    const along = run.idler.along;
    const at: Point = [span[1][0] + (span[0][0] - span[1][0]) * along, span[1][1] + (span[0][1] - span[1][1]) * along + sign * run.idler.press * scale];
    sheet.line(span[1], at).line(at, span[0]);
    sheet.circle([at[0], at[1] - sign * 18], 17, 'outline', 'shim');
    sheet.label([at[0], at[1] - sign * 18], [at[0] + 60, sign > 0 ? 120 : 440], `IDLER ON THE ${run.idler.side.toUpperCase()} SIDE`, ink.brass);
    const other = run.idler.side === 'slack' ? upper : lower;
    sheet.line(other[0], other[1]);
  } else sheet.line(upper[0], upper[1]).line(lower[0], lower[1]);
  sheet.path(arc(big, bigRadius + 5, 90 - lean, 270 + lean)).path(arc(small, smallRadius + 5, -90 + lean, 90 - lean));
  sheet.across(big[0], small[0], 500, `CENTRES ${figure(run.centres)}`, [big[1] + 20, small[1] + 20]);
  const wrap = 180 - 2 * lean;
  sheet.text(48, 62, `WRAP ON THE SMALL PULLEY ${figure(wrap, 0)}° · ${figure((run.smallTeeth * wrap) / 360, 1)} TEETH CARRY`, { height: 13 });
  sheet.label(around(big, bigRadius * 0.88, 150), [110, 110], `${run.bigTeeth} TEETH`).label([small[0], small[1] - smallRadius * 0.7], [small[0] + 50, 150], `${run.smallTeeth} TEETH`);
  if (run.slotTravel !== undefined) {
    sheet.path(`M${small[0] - 34} ${small[1] + smallRadius + 34}h68a9 9 0 0 1 0 18h-68a9 9 0 0 1 0 -18Z`, 'outline', 'none');
    sheet.label([small[0], small[1] + smallRadius + 43], [small[0] + 60, 396], `SLOT TRAVEL ${figure(run.slotTravel)}`);
  }
  return sheet.toSvg();
}

const arc = (centre: Point, radius: number, from: number, to: number): string => {
  const start = around(centre, radius, from);
  const end = around(centre, radius, to);
  return `M${start[0].toFixed(1)} ${start[1].toFixed(1)}A${radius.toFixed(1)} ${radius.toFixed(1)} 0 ${to - from > 180 ? 1 : 0} 0 ${end[0].toFixed(1)} ${end[1].toFixed(1)}`;
};

export interface HolePattern {
  readonly title: string;
  readonly plate: string;
  readonly body: string;
  /** Bolt circles, mm. */
  readonly plateCircle: number;
  readonly bodyCircle: number;
  readonly holes: number;
  readonly holeDiameter: number;
  readonly screwDiameter: number;
  /** Turn of the body's pattern against the plate's, degrees. */
  readonly turn?: number;
  readonly slots?: boolean;
}

/** Plan of two hole patterns laid over each other: plate holes as outlines, screws as they want to stand. */
export function holePlan(pattern: HolePattern): string {
  const sheet = new Sheet(pattern.title, 'PLAN · HOLES TO SCALE · DIMENSIONS IN mm');
  const scale = 330 / Math.max(pattern.plateCircle, pattern.bodyCircle);
  const centre: Point = [380, 290];
  sheet.circle(centre, 226, 'outline', 'none').circle(centre, 58, 'outline', 'none').centre(centre, 246);
  sheet.circle(centre, (pattern.plateCircle / 2) * scale, 'axis');
  let touches = false;
  for (let hole = 0; hole < pattern.holes; hole++) {
    const angle = 45 + (360 / pattern.holes) * hole;
    const at = around(centre, (pattern.plateCircle / 2) * scale, angle);
    const screw = around(centre, (pattern.bodyCircle / 2) * scale, angle + (pattern.turn ?? 0));
    const holeRadius = (pattern.holeDiameter / 2) * scale;
    const screwRadius = (pattern.screwDiameter / 2) * scale;
    if (pattern.slots) {
      const [ux, uy] = [Math.cos((angle * Math.PI) / 180), -Math.sin((angle * Math.PI) / 180)];
      const reach = Math.abs(pattern.plateCircle - pattern.bodyCircle) * scale;
      const [sx, sy] = [-uy * holeRadius, ux * holeRadius];
      const a: Point = [at[0] - ux * reach, at[1] - uy * reach];
      const b: Point = [at[0] + ux * reach, at[1] + uy * reach];
      sheet.path(`M${a[0] + sx} ${a[1] + sy}L${b[0] + sx} ${b[1] + sy}A${holeRadius} ${holeRadius} 0 0 0 ${b[0] - sx} ${b[1] - sy}L${a[0] - sx} ${a[1] - sy}A${holeRadius} ${holeRadius} 0 0 0 ${a[0] + sx} ${a[1] + sy}Z`, 'brass', 'none');
    } else sheet.circle(at, holeRadius, 'outline', 'none');
    const miss = Math.hypot(at[0] - screw[0], at[1] - screw[1]);
    const bad = !pattern.slots && miss > holeRadius - screwRadius;
    touches ||= bad;
    sheet.circle(screw, screwRadius, bad ? 'red' : 'thin', bad ? 'open' : 'shim');
    if (hole === 0) sheet.label(screw, [660, 130], `${pattern.body} Ø${figure(pattern.screwDiameter)} ON Ø${figure(pattern.bodyCircle)}`, bad ? ink.red : ink.blue);
  }
  sheet.label(around(centre, 200, 0), [680, 330], `${pattern.plate} Ø${figure(pattern.holeDiameter)} ON Ø${figure(pattern.plateCircle)}`);
  const half = (pattern.plateCircle / 2) * scale;
  sheet.across(centre[0] - half, centre[0] + half, 556, `BOLT CIRCLE ${figure(pattern.plateCircle)}`, 290);
  if (touches) sheet.text(48, 62, 'SCREWS FOUL THE HOLES', { colour: ink.red, height: 14 });
  return sheet.toSvg();
}

export interface Envelope {
  readonly title: string;
  readonly hub: string;
  /** What stands round the axis: from and to in degrees anticlockwise from three o'clock, and its name. */
  readonly taken: readonly { readonly from: number; readonly to: number; readonly name: string }[];
  /** Where the moving piece wants to be. */
  readonly wanted: { readonly from: number; readonly to: number; readonly name: string };
}

/** End view of the room round an axis: what is taken, what is wanted, and where they meet. */
export function envelopePlan(envelope: Envelope): string {
  const sheet = new Sheet(envelope.title, 'END VIEW FROM THE CAMERA · ANGLES IN DEGREES');
  const centre: Point = [470, 290];
  sheet.circle(centre, 96, 'outline', 'steel').circle(centre, 62, 'outline', 'none').centre(centre, 236);
  const sector = (from: number, to: number, inner: number, outer: number): string => {
    const [a, b, c, d] = [around(centre, inner, from), around(centre, outer, from), around(centre, outer, to), around(centre, inner, to)];
    const large = to - from > 180 ? 1 : 0;
    return `M${a.join(' ')}L${b.join(' ')}A${outer} ${outer} 0 ${large} 0 ${c.join(' ')}L${d.join(' ')}A${inner} ${inner} 0 ${large} 1 ${a.join(' ')}Z`;
  };
  const { wanted } = envelope;
  const clashes = envelope.taken.filter((item) => item.from < wanted.to && wanted.from < item.to);
  const names: { on: Point; text: string; colour: string }[] = [];
  for (const item of envelope.taken) {
    sheet.path(sector(item.from, item.to, 100, 188), 'outline', 'print');
    names.push({ on: around(centre, 150, (item.from + item.to) / 2), text: `${item.name} ${item.from}-${item.to}°`, colour: ink.blue });
  }
  sheet.path(sector(wanted.from, wanted.to, 104, 216), clashes.length > 0 ? 'red' : 'brass');
  for (const item of clashes) {
    sheet.add(`<path d="${sector(Math.max(item.from, wanted.from), Math.min(item.to, wanted.to), 104, 188)}" fill="url(#clash)" stroke="${ink.red}" stroke-width="1.6"/>`);
  }
  const colour = clashes.length > 0 ? ink.red : ink.brass;
  names.push({ on: around(centre, 206, (wanted.from + wanted.to) / 2), text: `${wanted.name} ${wanted.from}-${wanted.to}°`, colour });
  names.push({ on: around(centre, 78, 290), text: envelope.hub, colour: ink.blue });
  // Names stand in two columns, far enough apart not to run into each other.
  for (const right of [false, true]) {
    let free = 64;
    for (const name of names.filter((item) => item.on[0] >= centre[0] === right).sort((one, other) => one.on[1] - other.on[1])) {
      const y = Math.max(free, Math.min(520, name.on[1] - 26));
      sheet.label(name.on, [right ? 730 : 100, y], name.text, name.colour);
      free = y + 36;
    }
  }
  return sheet.toSvg();
}

export interface RingClamp {
  readonly title: string;
  readonly tube: number;
  readonly ring: number;
  readonly lining: number;
  readonly clamp: string;
  readonly tubeName: string;
  /** Angles of the places that carry the load. */
  readonly carries: readonly number[];
}

/** Section across a tube in its split ring. */
export function ringClampSection(pair: RingClamp): string {
  const sheet = new Sheet(pair.title, 'SECTION ACROSS THE TUBE · DIMENSIONS IN mm');
  const centre: Point = [370, 296];
  const tubeRadius = 148;
  const room = ((pair.ring - pair.tube) / 2) * 9;
  const ringRadius = tubeRadius + Math.max(8, room);
  sheet.circle(centre, ringRadius + 40, 'outline', 'print').circle(centre, ringRadius, 'outline', 'none');
  for (let lining = 0; lining < 3; lining++) {
    const from = 30 + lining * 120;
    const [a, b] = [around(centre, (ringRadius + tubeRadius) / 2, from - 32), around(centre, (ringRadius + tubeRadius) / 2, from + 32)];
    const radius = (ringRadius + tubeRadius) / 2;
    sheet.add(`<path d="M${a.join(' ')}A${radius} ${radius} 0 0 0 ${b.join(' ')}" fill="none" stroke="#e8cf95" stroke-width="${Math.max(6, ringRadius - tubeRadius - 2)}"/>`);
  }
  sheet.circle(centre, tubeRadius, 'outline', 'steel').circle(centre, tubeRadius - 12, 'outline', 'none').centre(centre, 220);
  sheet.box(centre[0] + ringRadius + 30, centre[1] - 36, 58, 28, 'print').box(centre[0] + ringRadius + 30, centre[1] + 8, 58, 28, 'print').line([centre[0] + ringRadius + 60, centre[1] - 70], [centre[0] + ringRadius + 60, centre[1] + 70], 'axis');
  for (const angle of pair.carries) {
    const [x, y] = around(centre, tubeRadius + 1, angle);
    sheet.line([x, y], around(centre, tubeRadius - 46, angle), 'red').circle([x, y], 6, 'red');
  }
  if (pair.carries.length > 0) sheet.label(around(centre, tubeRadius, pair.carries[0] ?? 90), [650, 90], 'CARRIES ONLY HERE', ink.red);
  sheet.across(centre[0] - tubeRadius, centre[0] + tubeRadius, 530, `TUBE Ø${figure(pair.tube)}`, centre[1]);
  sheet.label(around(centre, ringRadius + 22, 128), [160, 84], `${pair.clamp} Ø${figure(pair.ring)}`);
  sheet.label(around(centre, tubeRadius - 6, 215), [150, 470], pair.tubeName).label(around(centre, (ringRadius + tubeRadius) / 2, 150), [130, 190], `LINING ${figure(pair.lining)}`, ink.brass);
  return sheet.toSvg();
}
