import type { Layer } from './ink';
import { plantDrawing } from './plants';

/** A plant in the club's one ink. It stands beside its name, so it is not read out. */
export function Flower({ plant, width, height }: { /** A key or a common name. */ plant: string; width?: number; height?: number }) {
  const drawing = plantDrawing(plant);
  const scale = height === undefined ? (width ?? drawing.width) / drawing.width : Math.min(height / drawing.height, (width ?? Infinity) / drawing.width);
  return (
    <svg
      width={Math.round(drawing.width * scale)}
      height={Math.round(drawing.height * scale)}
      viewBox={`0 0 ${drawing.width} ${drawing.height}`}
      className="block max-w-full shrink-0 overflow-visible text-conifer"
      aria-hidden="true"
      strokeLinecap="round"
      strokeLinejoin="round"
    >
      {drawing.layers.map((layer, index) => (
        <path key={index} d={layer.d} strokeWidth={layer.width} {...inks[layer.as]} />
      ))}
    </svg>
  );
}

const inks: Record<Layer['as'], { fill: string; stroke?: string }> = {
  ink: { fill: 'currentColor' },
  line: { fill: 'none', stroke: 'currentColor' },
  cut: { fill: 'none', stroke: 'var(--ground)' },
  open: { fill: 'var(--ground)', stroke: 'currentColor' },
};
