import { useState } from 'react';
import type { KeyboardEvent, PointerEvent } from 'react';
import type { Scale } from './chart-scale.js';

interface CursorOptions {
  /** the axis that is read along */
  scale: Scale;
  axis: 'x' | 'y';
  to: number;
  /** what an arrow key moves by */
  step: number;
  /** where the keys begin */
  start: number;
}

/** A cursor along one axis of a drawing, moved by pointer or by arrow keys; Escape takes it away. */
export function useChartCursor({ scale, axis, to, step, start }: CursorOptions) {
  const [at, setAt] = useState<number | null>(null);
  const put = (value: number) => setAt(Math.min(to, Math.max(0, Math.round(value / step) * step)));
  const moves: Record<string, (now: number) => number> = {
    ArrowRight: (n) => n + step, ArrowUp: (n) => n + step, ArrowLeft: (n) => n - step, ArrowDown: (n) => n - step,
    PageUp: (n) => n + 10 * step, PageDown: (n) => n - 10 * step, Home: () => 0, End: () => to,
  };
  return {
    at,
    handlers: {
      onPointerMove: (event: PointerEvent<SVGElement>) => {
        const svg = event.currentTarget.ownerSVGElement as SVGSVGElement;
        const rect = svg.getBoundingClientRect();
        const px = axis === 'x' ? ((event.clientX - rect.left) / rect.width) * svg.viewBox.baseVal.width : ((event.clientY - rect.top) / rect.height) * svg.viewBox.baseVal.height;
        put(scale.invert(px));
      },
      onPointerLeave: () => setAt(null),
      onBlur: () => setAt(null),
      onKeyDown: (event: KeyboardEvent) => {
        if (event.key === 'Escape') return setAt(null);
        const move = moves[event.key];
        if (!move || event.altKey || event.ctrlKey || event.metaKey) return;
        event.preventDefault();
        put(move(at ?? Math.round(start / step) * step));
      },
    },
  };
}
