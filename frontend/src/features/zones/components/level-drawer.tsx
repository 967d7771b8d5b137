import { levelInputSchema } from '@mantlet/common';
import type { LevelDto } from '@mantlet/common';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { NumberField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useContractForm, useServerIssues } from '../../../ui/form/use-contract-form.js';
import { useDeleteLevel, useLevels, useSaveLevel } from '../api/zones.js';

interface LevelDrawerProps { projectId: string; level: LevelDto | null; /** suggested for a new level: where the highest one ends */ nextElevationM: number; onClose: () => void }

export function LevelDrawer({ projectId, level, nextElevationM, onClose }: LevelDrawerProps) {
  const levels = useLevels(projectId);
  const save = useSaveLevel(projectId, level?.id ?? null);
  const remove = useDeleteLevel(projectId);
  const form = useContractForm(levelInputSchema, level
    ? { values: { code: level.code, name: level.name, elevationM: level.elevationM, heightM: level.heightM } }
    : { defaultValues: { code: '', name: '', elevationM: nextElevationM } });
  useServerIssues(form, save.error);
  const submit = form.handleSubmit((body) => save.mutate(level ? { ...body, version: level.version } : body, { onSuccess: onClose }));
  return (
    <FormDrawer
      title={level ? `Level ${level.code}` : 'New level'} open onClose={onClose} onSubmit={(e) => { void submit(e); }}
      dirty={form.formState.isDirty && !save.isSuccess} saving={save.isPending} error={save.error ?? remove.error} onReload={() => { void levels.refetch(); }} size={440}
      extra={level && <DeleteButton what={`level ${level.code}`} consequence="Only a level without zones can be deleted." busy={remove.isPending} onDelete={() => remove.mutate(level.id, { onSuccess: onClose })} />}
    >
      <TextField control={form.control} name="code" label="Code" help="Short, as drawings use it: B1, L0, RF." />
      <TextField control={form.control} name="name" label="Name" />
      <div className="mt-form-row">
        <NumberField control={form.control} name="elevationM" label="Elevation" unit="m" decimals={3} help="Top of structural floor above the project's datum; negative below it." />
        <NumberField control={form.control} name="heightM" label="Height" unit="m" decimals={3} help="To the next floor or the roof." />
      </div>
    </FormDrawer>
  );
}
