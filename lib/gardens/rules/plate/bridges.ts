import { groundAt, HEIGHT, type Block } from './block';
import { box, f, ff, line, shape, type Cuts } from './cut';

type Span = { readonly block: Block; readonly from: number; readonly to: number; readonly rail: number };

const sleepers = ({ from, to, rail }: Span, step: number, width: number, down: number): Cuts => {
  const out: Cuts[] = [];
  for (let x = from; x < to; x += step) out.push(box(x, rail + down, width, 0.8));
  return out.flat();
};

function trestle(span: Span): Cuts {
  const { block, from, to, rail } = span;
  const bents = Math.max(3, Math.round((to - from) / 8.5));
  const place = (i: number): number => from + ((to - from) * i) / bents;
  const foot = (x: number): number => Math.max(rail + 4, groundAt(block, x) + 0.6);
  let posts = '', rakers = '', caps = '', braces = '';
  for (let i = 0; i <= bents; i++) {
    const x = place(i);
    const bottom = foot(x);
    const batter = (bottom - rail) * 0.1;
    posts += `M${ff(x, rail + 2)}V${f(bottom)}`;
    rakers += `M${ff(x - 1, rail + 2)}L${ff(x - 1 - batter, bottom)}M${ff(x + 1, rail + 2)}L${ff(x + 1 + batter, bottom)}`;
    for (let y = rail + 8; y < bottom - 1; y += 7) caps += `M${ff(x - 1.6 - (y - rail) * 0.1, y)}H${f(x + 1.6 + (y - rail) * 0.1)}`;
    if (i === bents) continue;
    const next = place(i + 1);
    const lower = Math.min(bottom, groundAt(block, next));
    for (let y = rail + 2; y < lower - 5; y += 8) braces += `M${ff(x, y)}L${ff(next, Math.min(y + 8, lower))}M${ff(next, y)}L${ff(x, Math.min(y + 8, lower))}`;
  }
  return [
    ...line(posts, 1), ...line(rakers, 0.85), ...line(caps, 0.65), ...line(braces, 0.38),
    ...box(from - 2, rail + 1, to - from + 4, 1.5), ...line(`M${ff(from - 2, rail + 1.9)}H${f(to + 2)}`, 0.22, 'paper'),
    ...sleepers({ ...span, from: from - 2, to: to + 2 }, 1.5, 0.8, 0.4),
  ];
}

function viaduct(span: Span): Cuts {
  const { from, to, rail } = span;
  const arches = Math.max(3, Math.round((to - from) / 13));
  const width = (to - from) / arches;
  const radius = (width - 3) / 2;
  let wall = `M${ff(from - 2, rail + 0.4)}H${f(to + 2)}V${HEIGHT}H${f(from - 2)}Z`;
  let stones = '', courses = '';
  for (let i = 0; i < arches; i++) {
    const middle = from + i * width + width / 2;
    wall += `M${ff(middle - radius, HEIGHT)}V${f(rail + 4 + radius)}a${ff(radius, radius)} 0 0 1 ${ff(2 * radius, 0)}V${HEIGHT}Z`;
    for (let t = 0; t <= 12; t++) {
      const turn = Math.PI * (1 + t / 12);
      const on = (reach: number): string => ff(middle + Math.cos(turn) * reach, rail + 4 + radius + Math.sin(turn) * reach);
      stones += `M${on(radius + 0.3)}L${on(radius + 1.25)}`;
    }
    for (let y = rail + 6 + radius; y < HEIGHT; y += 2) courses += `M${ff(from + i * width - 0.9, y)}h1.8`;
  }
  return [
    ...shape(wall, 'ink', ' fill-rule="evenodd"'), ...box(from - 2.6, rail + 1.7, to - from + 5.2, 0.5, 'paper'),
    ...line(stones, 0.26, 'paper'), ...line(courses, 0.24, 'paper'), ...sleepers({ ...span, from: from - 2, to: to + 2 }, 1.9, 1.05, 0.3),
  ];
}

function girder({ from, to, rail }: Span): Cuts {
  const middle = (from + to) / 2;
  let ribs = '', courses = '';
  for (let x = from + 1.5; x < to; x += 3) ribs += `M${ff(x, rail + 1.9)}v1.7`;
  for (let y = rail + 6; y < HEIGHT; y += 2.2) courses += `M${ff(middle - 2, y)}h1.8M${ff(middle + 0.4, y + 1.1)}h1.8`;
  return [
    ...box(from - 1, rail + 1, to - from + 2, 3.4), ...line(`M${ff(from - 1, rail + 1.8)}H${f(to + 1)}M${ff(from - 1, rail + 3.8)}H${f(to + 1)}${ribs}`, 0.25, 'paper'),
    ...shape(`M${ff(middle - 2, rail + 4.4)}h4l1.2 ${f(HEIGHT - rail)}h-6.4Z`), ...line(courses, 0.24, 'paper'),
  ];
}

const TRUSS_HEIGHT = 9;

const trussFloor = (span: Span): Cuts => [...box(span.from - 1, span.rail + 0.9, span.to - span.from + 2, 1.5), ...sleepers({ ...span, from: span.from - 1, to: span.to + 1 }, 1.6, 0.9, 0.3)];

function trussSide({ from, to, rail }: Span): Cuts {
  const panels = Math.max(4, Math.round((to - from) / 8));
  const top = rail - TRUSS_HEIGHT;
  const place = (i: number): number => from + ((to - from) * i) / panels;
  let d = `M${ff(place(1), top)}H${f(place(panels - 1))}`;
  for (let i = 0; i < panels; i++) {
    if (i > 0) d += `M${ff(place(i), rail + 1)}V${f(top)}`;
    const rises = i === 0 || (i >= panels / 2 && i !== panels - 1);
    d += `M${ff(place(i), rises ? rail + 1 : top)}L${ff(place(i + 1), rises ? top : rail + 1)}`;
  }
  return line(d, 0.6);
}

const spanOf = (block: Block): Span | null => (block.gap ? { block, from: block.gap[0], to: block.gap[1], rail: block.rail } : null);

/** The bridge behind and under the train. */
export function cutBridge(block: Block): Cuts {
  const span = spanOf(block);
  if (!span || block.bridge === 'none') return [];
  return { trestle, viaduct, girder, truss: trussFloor }[block.bridge](span);
}

/** The near side of a through bridge, which stands before the train. */
export function cutNearSide(block: Block): Cuts {
  const span = spanOf(block);
  return span && block.bridge === 'truss' ? trussSide(span) : [];
}
