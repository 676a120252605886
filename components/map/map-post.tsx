import { Post } from '../drawing/post';

/** The post at a garden's neighbourhood, its foot at the origin; in daylight inks, because it always stands on pasteboard colour. */
export function MapPost({ number, height }: { readonly number: number; readonly height: number }) {
  return (
    <g
      transform={`translate(${-Math.round((height * 54) / 84) / 2} ${-height})`}
      className="[--color-ink:var(--color-card-ink)] [--color-paper:var(--color-sun-paper)] [--post-edge:var(--color-card-ink)]"
    >
      <Post stopNumber={number} height={height} label={null} />
    </g>
  );
}
