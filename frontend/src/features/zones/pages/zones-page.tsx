import { Button } from 'antd';
import { useEffect, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { fireCurveNames } from '@mantlet/common';
import type { LevelDto, ProjectDto, ZoneDto } from '@mantlet/common';
import { count, countWord } from '../../../lib/format.js';
import { whyNot } from '../../../lib/may.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { StatusWord } from '../../../ui/status-word.js';
import { RequireRight, useCurrentProject, useMay } from '../../projects/project-context.js';
import { useLevels, useZones } from '../api/zones.js';
import { LevelDrawer } from '../components/level-drawer.js';
import { ProtectionDrawer } from '../components/protection-drawer.js';
import { ZoneDrawer } from '../components/zone-drawer.js';
import { commonCurve, treeRows, ZoneTree } from '../components/zone-tree.js';
import '../zones.css';

export function zonesWords(levels: readonly LevelDto[], zones: readonly ZoneDto[]): { heading: string; sub: string } {
  if (levels.length === 0) return { heading: 'No levels yet', sub: 'Every member belongs to a zone, and every zone to a level.' };
  if (zones.length === 0) return { heading: `${countWord(levels.length)} ${levels.length === 1 ? 'level' : 'levels'}, no zone yet`, sub: 'A zone is a part of a level with one period and one fire curve.' };
  const periods = zones.map((z) => z.periodMin);
  const from = Math.min(...periods);
  const to = Math.max(...periods);
  const open = zones.filter((z) => z.open > 0);
  const bare = zones.filter((z) => z.systems.length === 0);
  const curve = commonCurve(zones);
  return {
    heading: `${count(zones.length, 'zone')} on ${count(levels.length, 'level')}, ${from === to ? `${from}` : `${from} to ${to}`} minutes`,
    sub: [
      curve && zones.length > 1 ? `${fireCurveNames[curve]} throughout.` : '',
      open.length ? `${countWord(open.length)} ${open.length === 1 ? 'zone has' : 'zones have'} members open.` : 'No zone has members open.',
      bare.length ? `${countWord(bare.length)} ${bare.length === 1 ? 'has' : 'have'} no protection system yet.` : '',
    ].filter(Boolean).join(' '),
  };
}

type Editing = { what: 'level'; id: string | null } | { what: 'zone'; id: string | null; levelId: string | null } | { what: 'protection'; id: string } | null;

function Editor({ editing, project, levels, zones, onClose }: { editing: Editing; project: ProjectDto; levels: readonly LevelDto[]; zones: readonly ZoneDto[]; onClose: () => void }) {
  if (!editing) return null;
  const zone = editing.what === 'level' ? undefined : zones.find((z) => z.id === editing.id);
  if (editing.what === 'level') {
    const top = Math.max(0, ...levels.map((l) => l.elevationM + l.heightM));
    return <LevelDrawer projectId={project.id} level={levels.find((l) => l.id === editing.id) ?? null} nextElevationM={Number(top.toFixed(3))} onClose={onClose} />;
  }
  if (editing.what === 'zone') return <ZoneDrawer projectId={project.id} zone={zone ?? null} levelId={editing.levelId} levels={levels} onClose={onClose} />;
  return zone ? <ProtectionDrawer projectId={project.id} zone={zone} onClose={onClose} /> : null;
}

interface ContentProps { project: ProjectDto; levels: LevelDto[]; zones: ZoneDto[]; /** the zone named by the address */ asked: string | null; editing: Editing; setEditing: (editing: Editing) => void }

function Content({ project, levels, zones, asked, editing, setEditing }: ContentProps) {
  const may = useMay();
  const found = asked === null || zones.some((z) => z.id === asked);
  const [openZones, setOpenZones] = useState<string[]>(asked ? [asked] : []);
  useEffect(() => {
    const row = asked ? document.getElementById(`row-${asked}`) : null;
    row?.scrollIntoView({ block: 'center' });
    row?.querySelector('a')?.focus({ preventScroll: true });
  }, [asked]);
  return (
    <>
      {!found && <p role="status"><StatusWord kind="attention">The zone of this address is not on this project; it may have been deleted. These are the zones there are.</StatusWord></p>}
      <Panel flush label="Levels and zones">
        {levels.length === 0 ? (
          <EmptyState title="Begin with the levels" action={may('edit-levels') ? <Button type="primary" onClick={() => setEditing({ what: 'level', id: null })}>Add the first level</Button> : null}>
            {may('edit-levels') ? 'From the lowest up: a code, a name, the height above the datum. Then add the zones on each.' : whyNot('edit-levels')}
          </EmptyState>
        ) : (
          <ZoneTree
            rows={treeRows(levels, zones)} projectId={project.id} openZones={openZones} onOpenZones={setOpenZones} marked={asked}
            actions={{
              editLevel: (l) => setEditing({ what: 'level', id: l.id }), addZone: (l) => setEditing({ what: 'zone', id: null, levelId: l.id }),
              editZone: (z) => setEditing({ what: 'zone', id: z.id, levelId: z.levelId }), editProtection: (z) => setEditing({ what: 'protection', id: z.id }),
            }}
          />
        )}
      </Panel>
      <p className="mt-sub">
        {zones.length > 0 && 'The three materials are what each policy would take: litres of coating, m³ of board and spray. The chosen one is bold. '}{may('edit-zones') ? '' : `${whyNot('edit-zones')} `}{may('edit-protection') ? '' : whyNot('edit-protection')}
      </p>
      <Editor editing={editing} project={project} levels={levels} zones={zones} onClose={() => setEditing(null)} />
    </>
  );
}

function Zones({ project }: { project: ProjectDto }) {
  const levels = useLevels(project.id);
  const zones = useZones(project.id);
  const may = useMay();
  const asked = useSearchParams()[0].get('zone');
  const code = zones.data?.find((z) => z.id === asked)?.code;
  const [editing, setEditing] = useState<Editing>(null);
  const addLevel = may('edit-levels') && levels.data?.length ? <Button onClick={() => setEditing({ what: 'level', id: null })}>Add level</Button> : null;
  const words = levels.data && zones.data ? zonesWords(levels.data, zones.data) : { heading: 'Zones', sub: undefined };
  return (
    <Page title="Zones" trail={code ? [code, 'Zones'] : undefined} projectName={project.name} heading={words.heading} sub={words.sub} actions={addLevel}>
      <QueryState query={levels} what="the levels">
        {(l) => <QueryState query={zones} what="the zones">{(z) => <Content key={`${project.id} ${asked}`} project={project} levels={l} zones={z} asked={asked} editing={editing} setEditing={setEditing} />}</QueryState>}
      </QueryState>
    </Page>
  );
}

export default function ZonesPage() {
  const project = useCurrentProject();
  return <RequireRight right="see-design"><Zones project={project} /></RequireRight>;
}
