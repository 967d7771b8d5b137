import { useMemo } from 'react';
import { useWatch } from 'react-hook-form';
import { environments, memberTypeNames, memberTypes, productKindNames, zoneProtectionSchema } from '@mantlet/common';
import type { MemberType, ZoneDto } from '@mantlet/common';
import { NumberField, RadioField, SelectField } from '../../../ui/form/fields.js';
import { FormDrawer } from '../../../ui/form/form-drawer.js';
import { Term } from '../../../ui/term.js';
import { useEditForm } from '../../../ui/form/use-edit-form.js';
import { useSaveProtection, useZoneProducts } from '../api/zones.js';

const environmentHelp: Record<(typeof environments)[number], string> = {
  C1: 'C1 very low: heated interior', C2: 'C2 low: unheated interior, rural', C3: 'C3 medium: urban, humid interior',
  C4: 'C4 high: industrial, coastal', C5: 'C5 very high: aggressive, coastal with salt', CX: 'CX extreme: offshore',
};
const environmentOptions = environments.map((value) => ({ value, label: environmentHelp[value] }));
const policyOptions = [
  { value: 'own', label: 'Each member its own thickness' },
  { value: 'bands', label: 'A few bands' },
  { value: 'one', label: 'One thickness for all' },
];
const versionless = zoneProtectionSchema.omit({ version: true });

const standing = ({ environment, targetPolicy, systems, version }: ZoneDto) => ({
  values: { environment, targetPolicy, systems: memberTypes.map((memberType) => ({ memberType, productId: systems.find((s) => s.memberType === memberType)?.productId ?? null })) }, version,
});

/** What the specifier decides of a zone: environment, target policy and a system by member type. */
export function ProtectionDrawer({ projectId, zone, onClose }: { projectId: string; zone: ZoneDto; onClose: () => void }) {
  const products = useZoneProducts(projectId);
  const save = useSaveProtection(projectId, zone.id);
  const title = `Protection of ${zone.code} ${zone.name}`;
  const productName = (system: unknown) => {
    const id = (system as { productId?: string | null } | undefined)?.productId;
    return id ? products.data?.find((p) => p.id === id)?.name ?? 'a product that is no longer in the library' : 'no system';
  };
  const { form, edit } = useEditForm({
    schema: versionless, name: `protection/${zone.id}`, title, read: standing, save, onSaved: onClose,
    record: useMemo(() => standing(zone), [zone]),
    body: (input, { version }) => ({ ...input, version: version ?? zone.version }),
    words: {
      label: (path) => (path.startsWith('systems.') ? `System of ${memberTypeNames[path.slice('systems.'.length) as MemberType].toLowerCase()}` : path.startsWith('targetPolicy') ? 'Thicknesses in the zone' : undefined),
      value: (path, value) => (path.startsWith('systems.') ? productName(value) : undefined),
    },
  });
  const policy = useWatch({ control: form.control, name: 'targetPolicy.policy' });
  const productOptions = (products.data ?? []).map((p) => ({ value: p.id, label: `${p.name} (${productKindNames[p.kind].toLowerCase()})` }));
  return (
    <FormDrawer
      title={title} open onClose={onClose} edit={edit}
    >
      <SelectField control={form.control} name="environment" label="Environment" term="environment" options={environmentOptions} help="Corrosivity category of ISO 12944-2. A product must be assessed for it." />
      <RadioField control={form.control} name="targetPolicy.policy" label="Thicknesses in the zone" term="target-policy" options={policyOptions} help="Members of one system share a target; no member ever gets less than it needs." />
      {policy === 'bands' && <NumberField control={form.control} name="targetPolicy.bands" label="Bands at most" term="band" min={1} max={12} decimals={0} width={120} help="Split so that the least material is used." />}
      <fieldset>
        <legend><Term name="system">System</Term> by member type</legend>
        {products.data?.length === 0 && <p className="mt-help">The library holds no product yet. Add one under Products first.</p>}
        {memberTypes.map((type, i) => (
          <SelectField key={type} control={form.control} name={`systems.${i}.productId`} label={memberTypeNames[type]} options={productOptions} allowClear search placeholder="No system: stays not determined" />
        ))}
      </fieldset>
    </FormDrawer>
  );
}
