/** One to five places left, drawn as that many pegs. The figure beside them is what is read out. */
export function Pegs({ count, height = 17 }: { count: number; height?: number }) {
  const pegs = Array.from({ length: Math.min(5, Math.max(0, count)) }, (_, index) => index * 10);
  return (
    <svg width={((pegs.length * 10 - 4) * height) / 17} height={height} viewBox={`0 0 ${Math.max(1, pegs.length * 10 - 4)} 17`} className="inline-block align-[-1px]" aria-hidden="true">
      <path d={pegs.map((x) => `M${x} 0h6v11.600L${x + 3} 17l-3-5.400Z`).join('')} fill="currentColor" />
    </svg>
  );
}
