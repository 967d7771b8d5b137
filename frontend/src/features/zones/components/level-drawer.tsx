import { useMemo } from 'react';
import { levelInputSchema } from '@mantlet/common';
import type { LevelDto, LevelInput, LevelUpdate } from '@mantlet/common';
import { DeleteButton } from '../../../ui/form/delete-button.js';
import { NumberField, TextField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useDeleteLevel, useSaveLevel } from '../api/zones.js';

const standing = ({ code, name, elevationM, heightM, version }: LevelDto) => ({ values: { code, name, elevationM, heightM }, version });
const blank = (elevationM: number) => ({ values: { code: '', name: '', elevationM } as LevelInput, version: null });

interface LevelDrawerProps { projectId: string; level: LevelDto | null; /** suggested for a new level: where the highest one ends */ nextElevationM: number; onClose: () => void }

export function LevelDrawer({ projectId, level, nextElevationM, onClose }: LevelDrawerProps) {
  const save = useSaveLevel(projectId, level?.id ?? null);
  const makeAnew = useSaveLevel(projectId, null);
  const remove = useDeleteLevel(projectId);
  const title = level ? `Level ${level.code}` : 'New level';
  const { form, edit } = useEditForm({
    schema: levelInputSchema, name: level ? `level/${level.id}` : `new-level/${projectId}`, title, read: standing, save, onSaved: onClose,
    record: useMemo(() => (level ? standing(level) : blank(nextElevationM)), [level, nextElevationM]),
    body: (input, { version }): LevelInput | LevelUpdate => (version === null ? input : { ...input, version }),
    anew: (input) => makeAnew.mutateAsync(input),
  });
  return (
    <FormDrawer
      title={title} open onClose={onClose} edit={edit} error={makeAnew.error ?? remove.error} size={440}
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
