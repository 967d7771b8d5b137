interface DimensionLineProps {
  /** ends of the measured length, px */
  from: readonly [number, number];
  to: readonly [number, number];
  /** the figure, without its unit: drawings state mm once */
  text: string;
  /** the middle of the figure along the line, where that is not the line's own */
  middle?: number;
  /** where the figure stands beside a vertical line */
  side?: 'left' | 'right';
}

/** A dimension as drawings carry it: a thin line between oblique strokes, the figure beside it. */
export function DimensionLine({ from, to, text, middle, side = 'right' }: DimensionLineProps) {
  const vertical = Math.abs(to[1] - from[1]) > Math.abs(to[0] - from[0]);
  const [x, y] = [(from[0] + to[0]) / 2, (from[1] + to[1]) / 2];
  const tick = ([tx, ty]: readonly [number, number]) => `M${tx - 3.5} ${ty + 3.5}l7 -7`;
  const label = vertical ? { x: side === 'right' ? x + 14 : x - 6, y: middle ?? y } : { x: middle ?? x, y: y + 15 };
  return (
    <g aria-hidden="true">
      <path className="d-aid" d={`M${from[0]} ${from[1]}L${to[0]} ${to[1]}`} strokeWidth="1" />
      <path className="d-line" d={tick(from) + tick(to)} strokeWidth="1.3" />
      <text x={label.x} y={label.y} fontSize="12" textAnchor="middle" {...(vertical ? { transform: `rotate(-90 ${label.x} ${label.y})` } : {})}>{text}</text>
    </g>
  );
}
