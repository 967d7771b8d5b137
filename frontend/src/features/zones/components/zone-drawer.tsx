import { useMemo } from 'react';
import type { z } from 'zod';
import { useWatch } from 'react-hook-form';
import { fireCurveNames, ratingPeriods, zoneInputSchema } from '@mantlet/common';
import type { FireCurve, LevelDto, ZoneDto, ZoneInput, ZoneUpdate } from '@mantlet/common';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { NumberField, SelectField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useDeleteZone, useSaveZone } from '../api/zones.js';

const periods = ratingPeriods.map((value) => ({ value, label: `${value} minutes` }));
const curves = (Object.keys(fireCurveNames) as FireCurve['kind'][]).map((value) => ({ value, label: fireCurveNames[value] }));
const limits = [{ value: 15, label: '15 min, fast' }, { value: 20, label: '20 min, medium' }, { value: 25, label: '25 min, slow' }];
const levelName = (l: LevelDto) => `${l.code} ${l.name}`;

type Values = z.input<typeof zoneInputSchema>;
const standing = ({ levelId, code, name, periodMin, curve, reference, version }: ZoneDto) => ({ values: { levelId, code, name, periodMin, curve, reference } as Values, version });
const blank = (levelId: string | null) => ({ values: { ...(levelId ? { levelId } : {}), code: '', name: '', curve: { kind: 'standard' }, reference: '' } as Values, version: null });

interface ZoneDrawerProps { projectId: string; zone: ZoneDto | null; levelId: string | null; levels: readonly LevelDto[]; onClose: () => void }

/** What the fire engineer decides of a zone: its period, curve and where the fire strategy says so. */
export function ZoneDrawer({ projectId, zone, levelId, levels, onClose }: ZoneDrawerProps) {
  const save = useSaveZone(projectId, zone?.id ?? null);
  const makeAnew = useSaveZone(projectId, null);
  const remove = useDeleteZone(projectId);
  const title = zone ? `Zone ${zone.code}` : 'New zone';
  const levelOf = (id: unknown) => levels.find((l) => l.id === id);
  const { form, edit } = useEditForm({
    schema: zoneInputSchema, name: zone ? `zone/${zone.id}` : `new-zone/${projectId}`, title, read: standing, save, onSaved: onClose,
    record: useMemo(() => (zone ? standing(zone) : blank(levelId)), [zone, levelId]),
    body: (input, { version }): ZoneInput | ZoneUpdate => (version === null ? input : { ...input, version }),
    anew: (input) => makeAnew.mutateAsync(input),
    words: {
      label: (path) => ({ levelId: 'Level', periodMin: 'Period', 'curve.kind': 'Fire curve', curve: 'Fire curve' })[path],
      value: (path, value) => { const level = path === 'levelId' ? levelOf(value) : undefined; return level && levelName(level); },
    },
  });
  const kind = useWatch({ control: form.control, name: 'curve.kind' });
  return (
    <FormDrawer
      title={title} open onClose={onClose} edit={edit} error={makeAnew.error ?? remove.error}
      extra={zone && <DeleteButton what={`zone ${zone.code}`} consequence="Only a zone without members can be deleted." busy={remove.isPending} onDelete={() => remove.mutate(zone.id, { onSuccess: onClose })} />}
    >
      <div className="mt-form-row">
        <TextField control={form.control} name="code" label="Code" />
        <SelectField control={form.control} name="levelId" label="Level" options={levels.map((l) => ({ value: l.id, label: levelName(l) }))} />
      </div>
      <TextField control={form.control} name="name" label="Name" />
      <div className="mt-form-row">
        <SelectField control={form.control} name="periodMin" label="Period" term="period" options={periods} placeholder="Choose" />
        <SelectField control={form.control} name="curve.kind" label="Fire curve" term="fire-curve" options={curves} />
      </div>
      {kind === 'parametric' && (
        <fieldset>
          <legend>Parametric fire</legend>
          <p className="mt-help">EN 1991-1-2 Annex A. A member must survive the whole fire, cooling included: it is judged on its highest steel temperature, not on the period.</p>
          <div className="mt-form-row">
            <NumberField control={form.control} name="curve.openingFactor" label="Opening factor O" term="opening-factor" unit="m^½" help="0.02 to 0.20" />
            <NumberField control={form.control} name="curve.thermalAbsorptivity" label="Absorptivity b" term="thermal-inertia" unit="J/m²s^½K" help="100 to 2200" />
          </div>
          <div className="mt-form-row">
            <NumberField control={form.control} name="curve.fireLoadTotalMjPerM2" label="Fire load on the total area" term="fire-load" unit="MJ/m²" help="50 to 1000, related to the whole enclosure" />
            <SelectField control={form.control} name="curve.limitTimeMin" label="Limit time" options={limits} placeholder="Choose" />
          </div>
        </fieldset>
      )}
      <TextField control={form.control} name="reference" label="Reference" rows={2} help="Where the period comes from: the fire strategy's document and clause." />
    </FormDrawer>
  );
}
