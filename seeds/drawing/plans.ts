import { around, figure } from './geometry.js';
import { Sheet, ink, type Point } from './sheet.js';

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
      sheet.path(
        `M${a[0] + sx} ${a[1] + sy}L${b[0] + sx} ${b[1] + sy}A${holeRadius} ${holeRadius} 0 0 0 ${b[0] - sx} ${b[1] - sy}L${a[0] - sx} ${a[1] - sy}A${holeRadius} ${holeRadius} 0 0 0 ${a[0] + sx} ${a[1] + sy}Z`,
        'brass',
        'none',
      );
    } else sheet.circle(at, holeRadius, 'outline', 'none');
    const miss = Math.hypot(at[0] - screw[0], at[1] - screw[1]);
    const bad = !pattern.slots && miss > holeRadius - screwRadius;
    touches ||= bad;
    sheet.circle(screw, screwRadius, bad ? 'red' : 'thin', bad ? 'open' : 'shim');
    if (hole === 0)
      sheet.label(
        screw,
        [660, 130],
        `${pattern.body} Ø${figure(pattern.screwDiameter)} ON Ø${figure(pattern.bodyCircle)}`,
        bad ? ink.red : ink.blue,
      );
  }
  sheet.label(
    around(centre, 200, 0),
    [680, 330],
    `${pattern.plate} Ø${figure(pattern.holeDiameter)} ON Ø${figure(pattern.plateCircle)}`,
  );
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
    const [a, b, c, d] = [
      around(centre, inner, from),
      around(centre, outer, from),
      around(centre, outer, to),
      around(centre, inner, to),
    ];
    const large = to - from > 180 ? 1 : 0;
    return `M${a.join(' ')}L${b.join(' ')}A${outer} ${outer} 0 ${large} 0 ${c.join(' ')}L${d.join(' ')}A${inner} ${inner} 0 ${large} 1 ${a.join(' ')}Z`;
  };
  const { wanted } = envelope;
  const clashes = envelope.taken.filter((item) => item.from < wanted.to && wanted.from < item.to);
  const names: { on: Point; text: string; colour: string }[] = [];
  for (const item of envelope.taken) {
    sheet.path(sector(item.from, item.to, 100, 188), 'outline', 'print');
    names.push({
      on: around(centre, 150, (item.from + item.to) / 2),
      text: `${item.name} ${item.from}-${item.to}°`,
      colour: ink.blue,
    });
  }
  sheet.path(sector(wanted.from, wanted.to, 104, 216), clashes.length > 0 ? 'red' : 'brass');
  for (const item of clashes) {
    sheet.add(
      `<path d="${sector(Math.max(item.from, wanted.from), Math.min(item.to, wanted.to), 104, 188)}" fill="url(#clash)" stroke="${ink.red}" stroke-width="1.6"/>`,
    );
  }
  const colour = clashes.length > 0 ? ink.red : ink.brass;
  names.push({
    on: around(centre, 206, (wanted.from + wanted.to) / 2),
    text: `${wanted.name} ${wanted.from}-${wanted.to}°`,
    colour,
  });
  names.push({ on: around(centre, 78, 290), text: envelope.hub, colour: ink.blue });
  // Names stand in two columns, far enough apart not to run into each other.
  for (const right of [false, true]) {
    let free = 64;
    for (const name of names
      .filter((item) => item.on[0] >= centre[0] === right)
      .sort((one, other) => one.on[1] - other.on[1])) {
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
    const [a, b] = [
      around(centre, (ringRadius + tubeRadius) / 2, from - 32),
      around(centre, (ringRadius + tubeRadius) / 2, from + 32),
    ];
    const radius = (ringRadius + tubeRadius) / 2;
    sheet.add(
      `<path d="M${a.join(' ')}A${radius} ${radius} 0 0 0 ${b.join(' ')}" fill="none" stroke="#e8cf95" stroke-width="${Math.max(6, ringRadius - tubeRadius - 2)}"/>`,
    );
  }
  sheet
    .circle(centre, tubeRadius, 'outline', 'steel')
    .circle(centre, tubeRadius - 12, 'outline', 'none')
    .centre(centre, 220);
  sheet
    .box(centre[0] + ringRadius + 30, centre[1] - 36, 58, 28, 'print')
    .box(centre[0] + ringRadius + 30, centre[1] + 8, 58, 28, 'print')
    .line(
      [centre[0] + ringRadius + 60, centre[1] - 70],
      [centre[0] + ringRadius + 60, centre[1] + 70],
      'axis',
    );
  for (const angle of pair.carries) {
    const [x, y] = around(centre, tubeRadius + 1, angle);
    sheet.line([x, y], around(centre, tubeRadius - 46, angle), 'red').circle([x, y], 6, 'red');
  }
  if (pair.carries.length > 0)
    sheet.label(around(centre, tubeRadius, pair.carries[0] ?? 90), [650, 90], 'CARRIES ONLY HERE', ink.red);
  sheet.across(centre[0] - tubeRadius, centre[0] + tubeRadius, 530, `TUBE Ø${figure(pair.tube)}`, centre[1]);
  sheet.label(around(centre, ringRadius + 22, 128), [160, 84], `${pair.clamp} Ø${figure(pair.ring)}`);
  sheet
    .label(around(centre, tubeRadius - 6, 215), [150, 470], pair.tubeName)
    .label(
      around(centre, (ringRadius + tubeRadius) / 2, 150),
      [130, 190],
      `LINING ${figure(pair.lining)}`,
      ink.brass,
    );
  return sheet.toSvg();
}
