import { Alert, Button, InputNumber, Select } from 'antd';
import { useId, useState } from 'react';
import type { ReactNode } from 'react';
import type { ImportDto, ImportField, ImportMapping, ImportSheetDto } from '@mantlet/common';
import { exposureArrangements, exposureNames, importFieldNames, importLengthUnits, memberTypeNames, memberTypes, steelGrades } from '@mantlet/common';
import { FailedSave } from '../../../ui/form/failed-save.js';
import { useUnsavedChanges } from '../../../ui/form/use-unsaved-changes.js';
import type { TermName } from '../../../lib/terms.js';
import { Panel } from '../../../ui/panel.js';
import { Term } from '../../../ui/term.js';
import { useCurrentProject } from '../../projects/project-context.js';
import { useZones } from '../../zones/api/zones.js';
import { useSetMapping } from '../api/imports.js';
import { columnName } from '../import-words.js';
import { fieldOfColumn, mappingProblem, readableFields, readColumnAs, rowsFromHeader } from '../mapping.js';

function Labelled({ label, term, children }: { label: string; term?: TermName | undefined; children: (id: string) => ReactNode }) {
  const id = useId();
  return <div className="mt-field"><label className="mt-label" htmlFor={id}>{term ? <Term name={term}>{label}</Term> : label}</label>{children(id)}</div>;
}

interface PickProps<T extends string> { label: string; term?: TermName; value: T | null; options: { value: T; label: string }[]; onChange: (value: T | null) => void }
function Pick<T extends string>({ label, term, value, options, onChange }: PickProps<T>) {
  return (
    <Labelled label={label} term={term}>
      {(id) => <Select<T> id={id} value={value as T} onChange={(next) => onChange(next ?? null)} options={options} allowClear placeholder="None" style={{ width: '100%' }} showSearch={{ optionFilterProp: 'label' }} />}
    </Labelled>
  );
}

/** The first rows of the file with a choice above each column. */
function FirstRows({ sheet, headerRow, columns, fields, onChange }: { sheet: ImportSheetDto; headerRow: number; columns: ImportMapping['columns']; fields: readonly ImportField[]; onChange: (next: ImportMapping['columns']) => void }) {
  const width = Math.max(sheet.headers.length, ...sheet.firstRows.map((r) => r.length));
  const indices = Array.from({ length: width }, (_, i) => i);
  const { headers, rows } = rowsFromHeader(sheet, headerRow);
  const options = fields.map((value) => ({ value, label: importFieldNames[value] }));
  return (
    <div className="mt-first-rows" role="region" aria-label="First rows of the file" tabIndex={0}>
      <table>
        <thead>
          <tr>
            <td />
            {indices.map((i) => {
              const field = fieldOfColumn(columns, i);
              return (
                <th key={i} scope="col" data-read={field !== null}>
                  <Select<ImportField>
                    size="small" value={field as ImportField} placeholder="Not read" allowClear style={{ width: '100%', minWidth: 138 }} aria-label={`Column ${columnName(i)}, ${headers[i] || 'without a header'}, is read as`}
                    options={options} onChange={(next?: ImportField) => onChange(readColumnAs(columns, i, next ?? null))}
                  />
                </th>
              );
            })}
          </tr>
          <tr><th scope="row">{headerRow}</th>{indices.map((i) => <th key={i} scope="col">{headers[i] || <span className="mt-sub">column {columnName(i)}</span>}</th>)}</tr>
        </thead>
        <tbody>
          {rows.map(({ number, cells }) => <tr key={number}><th scope="row">{number}</th>{indices.map((i) => <td key={i} data-read={fieldOfColumn(columns, i) !== null}>{cells[i] ?? ''}</td>)}</tr>)}
        </tbody>
      </table>
    </div>
  );
}

function Defaults({ projectId, mapping, set }: { projectId: string; mapping: ImportMapping; set: (change: Partial<ImportMapping['defaults']>) => void }) {
  const zones = (useZones(projectId).data ?? []).map((z) => ({ value: z.id, label: `${z.code} ${z.name}` }));
  const { defaults } = mapping;
  return (
    <Panel title="For new members without a value" sub="Used where the file has no column or an empty cell. A member already there keeps what it has.">
      <div className="mt-form-row">
        <Pick label="Zone" term="zone" value={defaults.zoneId} options={zones} onChange={(zoneId) => set({ zoneId })} />
        <Pick label="Type" value={defaults.memberType} options={memberTypes.map((value) => ({ value, label: memberTypeNames[value] }))} onChange={(memberType) => set({ memberType })} />
        <Pick label="Steel grade" value={defaults.grade} options={steelGrades.map((value) => ({ value, label: value }))} onChange={(grade) => set({ grade })} />
        <Pick label="Exposure" term="exposure" value={defaults.exposure} options={exposureArrangements.map((value) => ({ value, label: exposureNames[value] }))} onChange={(exposure) => set({ exposure })} />
        <Pick label="Protection form" term="protection-form" value={defaults.protectionForm} options={[{ value: 'profile', label: 'Following the profile' }, { value: 'boxed', label: 'Boxed' }]} onChange={(protectionForm) => set({ protectionForm })} />
      </div>
    </Panel>
  );
}

function Reading({ data, mapping, set, chooseSheet }: { data: ImportDto; mapping: ImportMapping; set: (change: Partial<ImportMapping>) => void; chooseSheet: (name: string) => void }) {
  return (
    <div className="mt-form-row">
      {data.sheets.length > 1 && <Labelled label="Sheet">{(id) => <Select id={id} value={mapping.sheet} onChange={chooseSheet} options={data.sheets.map((s) => ({ value: s.name, label: `${s.name}, ${s.rows} rows` }))} style={{ width: '100%' }} />}</Labelled>}
      <Labelled label="Row of the headers">{(id) => <InputNumber<number> id={id} value={mapping.headerRow} min={1} max={1000} precision={0} changeOnWheel={false} onChange={(headerRow) => set({ headerRow: headerRow ?? 1 })} style={{ width: '100%' }} />}</Labelled>
      <Labelled label="Lengths without a unit are in">{(id) => <Select id={id} value={mapping.lengthUnit} onChange={(lengthUnit) => set({ lengthUnit })} options={importLengthUnits.map((value) => ({ value, label: value === 'ft-in' ? 'feet and inches' : value }))} style={{ width: '100%' }} />}</Labelled>
      {mapping.columns.criticalTemperature !== undefined && <Labelled label="Temperatures are in">{(id) => <Select id={id} value={mapping.temperatureUnit} onChange={(temperatureUnit) => set({ temperatureUnit })} options={[{ value: 'C', label: '°C' }, { value: 'F', label: '°F' }]} style={{ width: '100%' }} />}</Labelled>}
    </div>
  );
}

/** Which column holds what. The file stays on the server, so that this can be left and taken up again. */
export function ColumnsStep({ projectId, data, onChecked, onAbandon }: { projectId: string; data: ImportDto; onChecked: () => void; onAbandon: ReactNode }) {
  const project = useCurrentProject();
  const save = useSetMapping(projectId, data.id);
  const [mapping, setMapping] = useState<ImportMapping>(data.mapping);
  const set = (change: Partial<ImportMapping>) => setMapping((now) => ({ ...now, ...change }));
  useUnsavedChanges(mapping !== data.mapping && !save.isPending && !save.isSuccess);
  const sheet = data.sheets.find((s) => s.name === mapping.sheet) ?? data.sheets[0];
  const problem = mappingProblem(mapping);
  const chooseSheet = (name: string) => {
    const next = data.sheets.find((s) => s.name === name);
    if (next) set({ sheet: name, headerRow: next.headerRow, columns: name === data.mapping.sheet ? data.mapping.columns : {} });
  };
  return (
    <>
      {data.notes.length > 0 && <Alert type="warning" title="Worth a look" description={<ul className="mt-notes">{data.notes.map((note) => <li key={note}>{note}</li>)}</ul>} />}
      <Panel title={data.fileName} sub="Say what each column holds. A column left empty is not read.">
        <Reading data={data} mapping={mapping} set={set} chooseSheet={chooseSheet} />
        {sheet && <FirstRows sheet={sheet} headerRow={mapping.headerRow} columns={mapping.columns} fields={readableFields(project.roles.includes('structural-engineer'))} onChange={(columns) => set({ columns })} />}
      </Panel>
      <Defaults projectId={projectId} mapping={mapping} set={(change) => set({ defaults: { ...mapping.defaults, ...change } })} />
      <FailedSave error={save.error} />
      <div className="mt-form-foot">
        <Button type="primary" loading={save.isPending} disabled={problem !== null} onClick={() => save.mutate(mapping, { onSuccess: onChecked })}>{save.isPending ? 'Checking every row' : 'Check the rows'}</Button>
        {onAbandon}
        {problem && <span className="mt-sub" role="status">{problem}</span>}
      </div>
    </>
  );
}
