/** Diagonal hatch for use in an SVG: put it in <defs>, then fill with `url(#id)`. Open work and cut material are hatched. */
export function HatchPattern({ id, color = 'var(--attention)', spacing = 7, opacity = 0.55 }: { id: string; color?: string; spacing?: number; opacity?: number }) {
  return (
    <pattern id={id} width={spacing} height={spacing} patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
      <line x1="0" y1="0" x2="0" y2={spacing} stroke={color} strokeWidth="1.2" strokeOpacity={opacity} />
    </pattern>
  );
}
