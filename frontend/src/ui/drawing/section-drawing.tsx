import { useId } from 'react';
import type { Exposure, OutlineSegment, SectionOutline } from '@mantlet/common';
import { exposureNames } from '@mantlet/common';
import { formatNumber, joinWords } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { SymbolText } from './symbol-text.js';
import { DimensionLine } from './dimension-line.js';
import type { Box } from './label-layout.js';
import { loopPath, markedLength, placeSection, runPath, stretches } from './section-path.js';
import type { SectionPlace } from './section-path.js';
import { exposedFaces, surroundings } from './section-surroundings.js';
import { useElementWidth } from './use-element-width.js';
import './charts.css';

interface SectionDrawingProps {
  outline: SectionOutline;
  /** the section's name, for the text alternative */
  name: string;
  /** absent while a section is only being chosen: nothing is marked as heated then */
  exposure?: Exposure;
  /** thicknesses and radii for the line below: ['t_w', 8.5] */
  details?: readonly (readonly [string, number])[];
  maxHeight?: number;
}

const heated = (s: OutlineSegment) => s.heated;
const mm = (value: number) => (Number.isInteger(value) ? formatNumber(value) : formatNumber(value, 1));

interface Layout { width: number; height: number; place: SectionPlace; section: Box; reach: number }
function layoutSection({ widthMm, heightMm }: SectionOutline, exposure: Exposure | undefined, width: number, maxHeight: number): Layout {
  const surrounded = exposure !== undefined && exposure.arrangement !== 'four-sides';
  const top = surrounded ? 44 : 10;
  const [side, right, bottom] = [surrounded ? 48 : 16, 58, 40];
  const scale = Math.min((width - side - right) / widthMm, (maxHeight - top - bottom) / heightMm);
  const size = { width: widthMm * scale, height: heightMm * scale };
  const x = side + (width - side - right - size.width) / 2;
  return {
    width, height: top + size.height + bottom, section: { x, y: top, ...size }, reach: Math.min(x - 4, Math.max(34, size.width * 0.3)),
    place: placeSection(scale, x + size.width / 2, top + size.height / 2),
  };
}

function Heated({ loop, place }: { loop: readonly OutlineSegment[]; place: SectionPlace }) {
  return stretches(loop, heated).map(({ segments, closed }) => (
    <path key={`${segments[0]?.from.join()}`} className="d-heated" d={closed ? loopPath(segments, place) : runPath(segments, place)} />
  ));
}

function Around({ exposure, layout, hatch }: { exposure: Exposure; layout: Layout; hatch: string }) {
  return (
    <g aria-hidden="true">
      {surroundings(exposure, layout.section, layout.reach).map((part) => (
        <g key={`${part.x} ${part.y} ${part.height}`}>
          <rect x={part.x} y={part.y} width={part.width} height={part.height} className="d-aid" strokeWidth="1" />
          <rect x={part.x} y={part.y} width={part.width} height={part.height} fill={`url(#${hatch})`} />
          {part.label && <text className="d-sub" x={part.x} y={part.y - 7} fontSize="12">{part.label}</text>}
        </g>
      ))}
    </g>
  );
}

/** What the drawing shows, in words: the legend below it. */
export function sectionInWords(outline: SectionOutline, exposure: Exposure): string {
  const girth = markedLength(outline.box ? [outline.box] : outline.loops, heated);
  const coated = markedLength(outline.box ? [outline.box] : outline.loops, (s) => s.coated);
  const where = exposure.arrangement === 'given-faces' ? `Faces exposed: ${joinWords(exposedFaces(exposure))}.` : `${exposureNames[exposure.arrangement]}.`;
  const line = outline.box
    ? `Heavy line: protection as a box, heated girth ${formatNumber(girth)} mm.`
    : `Heavy line: heated faces, ${formatNumber(girth)} mm of girth; coated girth ${formatNumber(coated)} mm.`;
  return `${where} ${line}`;
}

/** A cross-section to scale with its heated faces in heavy line, what stands against it hatched, and its dimensions in mm. */
export function SectionDrawing({ outline, name, exposure, details = [], maxHeight = 330 }: SectionDrawingProps) {
  const { ref, width: measured } = useElementWidth<HTMLDivElement>(260);
  const hatch = useId();
  const layout = layoutSection(outline, exposure, Math.min(measured, 340), maxHeight);
  const { section: box, place } = layout;
  const words = exposure ? sectionInWords(outline, exposure) : '';
  const size = `${mm(outline.heightMm)} mm high and ${mm(outline.widthMm)} mm wide`;
  const dimX = Math.min(box.x + box.width + (exposure && exposure.arrangement !== 'four-sides' ? 24 : 18), layout.width - 26);
  return (
    <figure className="mt-figure" ref={ref}>
      <svg className="mt-drawing mt-section" viewBox={`0 0 ${layout.width} ${layout.height}`} style={{ maxWidth: layout.width }} role="img" aria-label={`Cross-section of ${name}, ${size}. ${words}`}>
        <defs><HatchPattern id={hatch} color="var(--ink-3)" spacing={6} opacity={0.7} /></defs>
        {exposure && <Around exposure={exposure} layout={layout} hatch={hatch} />}
        <path className="d-steel" fillRule="evenodd" d={outline.loops.map((loop) => loopPath(loop, place)).join('')} />
        {outline.loops.map((loop, i) => <Heated key={i} loop={loop} place={place} />)}
        {outline.box && <path className="d-box" d={loopPath(outline.box, place)} />}
        {outline.box && <Heated loop={outline.box} place={place} />}
        <DimensionLine from={[dimX, box.y]} to={[dimX, box.y + box.height]} text={mm(outline.heightMm)} />
        <DimensionLine from={[box.x, box.y + box.height + 18]} to={[box.x + box.width, box.y + box.height + 18]} text={mm(outline.widthMm)} />
      </svg>
      <figcaption className="mt-figure-note">
        {words && <p>{words}</p>}
        <p>Dimensions in mm{details.length > 0 && <>; {details.map(([symbol, value], i) => <span key={symbol}>{i > 0 && ', '}<SymbolText text={symbol} />{'\u00a0'}{mm(value)}</span>)}</>}.</p>
      </figcaption>
    </figure>
  );
}
