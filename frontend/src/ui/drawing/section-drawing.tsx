import { useId } from 'react';
import type { Exposure, OutlineSegment, SectionOutline } from '@mantlet/common';
import { exposureNames } from '@mantlet/common';
import { formatNumber, joinWords } from '../../lib/format.js';
import { HatchPattern } from '../hatch.js';
import { SymbolText } from './symbol-text.js';
import { DimensionLine } from './dimension-line.js';
import { layoutSection, mm, sectionDimensions } from './section-layout.js';
import type { SectionLayout } from './section-layout.js';
import { loopPath, markedLength, runPath, stretches } from './section-path.js';
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
  /** what protects it: drawn to scale where it is thick enough to be seen */
  protection?: { name: string; thickness: number; unit: 'µm' | 'mm' } | undefined;
  maxHeight?: number;
}

const heated = (s: OutlineSegment) => s.heated;

function Heated({ loop, place }: { loop: readonly OutlineSegment[]; place: SectionPlace }) {
  return stretches(loop, heated).map(({ segments, closed }) => (
    <path key={`${segments[0]?.from.join()}`} className="d-heated" d={closed ? loopPath(segments, place) : runPath(segments, place)} />
  ));
}

/** Protection stands outside the steel, or outside the box round it; the clip takes what of its line would lie within. */
function Cover({ outline, layout: { place, cover, width, height }, hatch }: { outline: SectionOutline; layout: SectionLayout; hatch: string }) {
  const clip = useId();
  const loops = (outline.box ? [outline.box] : outline.loops).filter((loop) => loop.some((s) => s.coated));
  const runs = loops.flatMap((loop) => stretches(loop, (s) => s.coated)).map(({ segments, closed }) => (closed ? loopPath(segments, place) : runPath(segments, place))).join('');
  return (
    <g aria-hidden="true">
      <defs><clipPath id={clip}><path clipRule="evenodd" d={`M0 0H${width}V${height}H0Z${loops.map((loop) => loopPath(loop, place)).join('')}`} /></clipPath></defs>
      <g clipPath={`url(#${clip})`}>
        <path className="d-cover" d={runs} strokeWidth={2 * cover} />
        <path fill="none" strokeLinejoin="miter" d={runs} stroke={`url(#${hatch})`} strokeWidth={2 * cover} />
      </g>
    </g>
  );
}

/** Thinner than this, protection is a line like any other: it is said, not drawn. */
const leastCoverMm = 3;
const coverMm = (protection: SectionDrawingProps['protection']) => (protection?.unit === 'mm' && protection.thickness >= leastCoverMm ? protection.thickness : 0);
function protectionInWords(protection: SectionDrawingProps['protection']): string {
  if (!protection) return '';
  const what = `${protection.name}, ${formatNumber(protection.thickness, Number.isInteger(protection.thickness) ? 0 : 1)} ${protection.unit}`;
  return coverMm(protection) > 0 ? ` Hatched round it: ${what}, to scale.` : ` ${what}: too thin to draw to scale.`;
}

function Around({ exposure, layout, hatch }: { exposure: Exposure; layout: SectionLayout; hatch: string }) {
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
export function SectionDrawing({ outline, name, exposure, details = [], protection, maxHeight = 330 }: SectionDrawingProps) {
  const { ref, width: measured } = useElementWidth<HTMLDivElement>(260);
  const hatch = useId();
  const cut = useId();
  const layout = layoutSection(outline, exposure, Math.min(measured, 340), maxHeight, coverMm(protection));
  const { place } = layout;
  const words = exposure ? sectionInWords(outline, exposure) + protectionInWords(protection) : '';
  const size = `${mm(outline.heightMm)} mm high and ${mm(outline.widthMm)} mm wide`;
  const dimensions = sectionDimensions(outline, layout, exposure !== undefined && exposure.arrangement !== 'four-sides');
  return (
    <figure className="mt-figure" ref={ref}>
      <svg className="mt-drawing mt-section" viewBox={`0 0 ${layout.width} ${layout.height}`} style={{ maxWidth: layout.width }} role="img" aria-label={`Cross-section of ${name}, ${size}. ${words}`}>
        <defs><HatchPattern id={hatch} color="var(--ink-3)" spacing={6} opacity={0.7} /><HatchPattern id={cut} color="var(--settled)" spacing={5} opacity={0.8} /></defs>
        {layout.cover > 0 && <Cover outline={outline} layout={layout} hatch={cut} />}
        {exposure && <Around exposure={exposure} layout={layout} hatch={hatch} />}
        <path className="d-steel" fillRule="evenodd" d={outline.loops.map((loop) => loopPath(loop, place)).join('')} />
        {outline.loops.map((loop, i) => <Heated key={i} loop={loop} place={place} />)}
        {outline.box && <path className="d-box" d={loopPath(outline.box, place)} />}
        {outline.box && <Heated loop={outline.box} place={place} />}
        <DimensionLine {...dimensions.height} />
        <DimensionLine {...dimensions.width} />
      </svg>
      <figcaption className="mt-figure-note">
        {words && <p>{words}</p>}
        <p>Dimensions in mm{details.length > 0 && <>; {details.map(([symbol, value], i) => <span key={symbol}>{i > 0 && ', '}<SymbolText text={symbol} />{'\u00a0'}{mm(value)}</span>)}</>}.</p>
      </figcaption>
    </figure>
  );
}
