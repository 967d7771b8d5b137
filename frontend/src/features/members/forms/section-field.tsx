import { Select } from 'antd';
import { useEffect, useId, useState } from 'react';
import { useController } from 'react-hook-form';
import type { SectionDto } from '@mantlet/common';
import { formatNumber } from '../../../lib/format.js';
import { SectionDrawing } from '../../../ui/drawing/section-drawing.js';
import { shapeDetails, shapePreview } from '../../../ui/drawing/shape-preview.js';
import { describedBy, FieldFrame } from '../../../ui/form/field-frame.js';
import type { AnyControl } from '../../../ui/form/fields.js';
import { useSection, useSections } from '../api/sections.js';
import { sectionLabel } from './member-form.js';

/** Follows what is typed after a pause, so that each letter is not a request. */
function usePaused(text: string): string {
  const [paused, setPaused] = useState(text);
  useEffect(() => {
    const timer = setTimeout(() => setPaused(text), 200);
    return () => clearTimeout(timer);
  }, [text]);
  return paused;
}

interface SectionFieldProps<T extends { sectionId?: string | null }> {
  control: AnyControl<T>;
  projectId: string;
  /** the section the form opened with, so that its name shows before any search */
  current: SectionDto | null;
  onChosen?: (section: SectionDto) => void;
  clearable?: boolean;
  help?: string;
}

/** Search in the catalogue and the project's own sections, by any usual spelling; the server understands them. */
export function SectionField<T extends { sectionId?: string | null }>({ control, projectId, current, onChosen, clearable = false, help }: SectionFieldProps<T>) {
  const id = useId();
  const { field, fieldState } = useController({ control, name: 'sectionId' as never });
  // taken apart here: the field's ref is a callback for the input, the rest are plain values
  const { ref, value, onBlur, onChange } = field;
  const [typed, setTyped] = useState('');
  const [taken, setTaken] = useState<SectionDto | null>(current);
  // a draft, or somebody else's version, brings an id that this form has not seen
  const strange = typeof value === 'string' && value !== current?.id && value !== taken?.id ? value : null;
  const fetched = useSection(projectId, strange).data;
  const search = usePaused(typed.trim());
  const found = useSections(projectId, search, search.length > 0);
  const items = search.length > 0 ? found.data?.items ?? [] : [];
  // the section it has stands first only while nothing is looked for: Enter must take what was found
  const held = [taken, current, fetched].find((section) => section?.id === value) ?? current;
  const known = held && (search.length === 0 || typed.trim().length === 0) ? [held] : items;
  const error = fieldState.error?.message;
  const words = help ?? 'Type its name: UB 457x191x67, 254 x 146 x 31 UB, IPE300, SHS 150x150x6.3.';
  const none = search.length === 0 ? 'Type the name of a section' : found.isFetching ? 'Searching…' : found.error ? 'The sections could not be searched. Try again.' : `No section is called "${search}"`;
  return (
    <FieldFrame id={id} label="Section" help={words} error={error}>
      <Select
        id={id} ref={ref} value={(value as string | null | undefined) ?? undefined} onBlur={onBlur} style={{ width: '100%' }} allowClear={clearable}
        aria-describedby={describedBy(id, words, error)} status={error ? 'error' : ''} placeholder="Search sections" notFoundContent={none} loading={found.isFetching}
        showSearch={{ filterOption: false, onSearch: setTyped, searchValue: typed }}
        options={known.map((s) => ({ value: s.id, label: sectionLabel(s) }))}
        onChange={(next?: string) => {
          onChange(next ?? null);
          setTyped('');
          const section = known.find((s) => s.id === next);
          setTaken(section ?? null);
          if (section) onChosen?.(section);
        }}
      />
    </FieldFrame>
  );
}

/** The chosen section drawn, with what it weighs and measures. */
export function ChosenSection({ section }: { section: SectionDto | null }) {
  const outline = section && shapePreview(section.shape);
  if (!section || !outline) return null;
  return (
    <div className="mt-chosen-section">
      <SectionDrawing outline={outline} name={section.designation} details={shapeDetails(section.shape)} maxHeight={210} />
      <p className="mt-help">{formatNumber(section.properties.massKgPerM, 1)} kg/m, {formatNumber(section.properties.areaMm2)} mm², full perimeter {formatNumber(section.properties.perimeterMm)} mm. {section.standard}</p>
    </div>
  );
}
