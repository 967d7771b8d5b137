import { Button, Select } from 'antd';
import { useEffect, useId } from 'react';
import { Link, useLocation, useSearchParams } from 'react-router-dom';
import type { ProjectDto, SiteDto, SiteLevelDto } from '@mantlet/common';
import { formatDate } from '../../../lib/format.js';
import { LinkButton } from '../../../ui/link-button.js';
import { Page } from '../../../ui/page.js';
import { Panel } from '../../../ui/panel.js';
import { EmptyState, QueryState } from '../../../ui/states.js';
import { Term } from '../../../ui/term.js';
import { useCurrentProject, useMay } from '../../projects/project-context.js';
import { pdfUrl } from '../../schedule/api/revisions.js';
import { AwaitedFrom } from '../../team/components/awaited-from.js';
import { useSite } from '../api/site.js';
import { Materials } from '../components/materials.js';
import { ZoneWork } from '../components/zone-work.js';
import { levelName, onlyInspects, shownLevels, siteHeading } from '../site-words.js';
import '../site.css';

/** Whole packages for the floor where the issued record counts them; what is used, otherwise. */
function LevelMaterials({ level, site }: { level: SiteLevelDto; site: SiteDto }) {
  const counted = level.purchase.length > 0;
  const materials = counted ? level.purchase : level.materials;
  if (materials.length === 0) return null;
  return (
    <>
      {counted && <p className="mt-sub">To bring here if this floor is delivered by itself. Packages are rounded up for each floor, so floors together may come to more than the whole job.</p>}
      <Materials materials={materials} caption={`Materials for ${level.code}`} currency={site.project?.currency ?? ''} prices={site.prices && !counted} />
    </>
  );
}

function Level({ level, site, inspects }: { level: SiteLevelDto; site: SiteDto; inspects: boolean }) {
  return (
    <section className="mt-panel mt-site-level" id={`level-${level.id}`} aria-labelledby={`level-${level.id}-name`}>
      <h2 id={`level-${level.id}-name`}>{levelName(level)}</h2>
      {!inspects && <LevelMaterials level={level} site={site} />}
      {level.zones.map((zone) => <ZoneWork key={zone.id} zone={zone} />)}
    </section>
  );
}

/** A floor to read, and the jumps to its zones. */
function Finder({ site, shown }: { site: SiteDto; shown: readonly SiteLevelDto[] }) {
  const [, setParams] = useSearchParams();
  const id = useId();
  const one = shown.length === 1 && site.levels.length > 1 ? shown[0]?.id ?? '' : '';
  return (
    <nav className="mt-site-finder mt-noprint" aria-label="Floors and zones">
      <div className="mt-field">
        <label className="mt-label" htmlFor={id}>Floor</label>
        <Select
          id={id} value={one} size="large" style={{ minWidth: 240 }} onChange={(level: string) => setParams(level ? { level } : {}, { replace: true })}
          options={[{ value: '', label: 'All floors' }, ...site.levels.map((l) => ({ value: l.id, label: levelName(l) }))]}
        />
      </div>
      <ul>{shown.flatMap((l) => l.zones).map((z) => <li key={z.id}><a href={`#zone-${z.id}`}>{z.code} {z.name}</a></li>)}</ul>
    </nav>
  );
}

function Issued({ site, project }: { site: SiteDto; project: ProjectDto }) {
  const [params] = useSearchParams();
  const { hash } = useLocation();
  const shown = shownLevels(site.levels, params.get('level'));
  const inspects = onlyInspects(project.roles);
  useEffect(() => { if (hash) document.getElementById(hash.slice(1))?.scrollIntoView(); }, [hash]);
  return (
    <>
      <Finder site={site} shown={shown} />
      {!inspects && shown.length === site.levels.length && site.purchase.length > 0 && (
        <Panel title="To buy for the whole job" sub="Containers, bags and sheets are rounded up once for each product.">
          <Materials materials={site.purchase} caption="To buy for the whole job" currency={site.project?.currency ?? project.currency} prices={site.prices} />
        </Panel>
      )}
      {shown.map((level) => <Level key={level.id} level={level} site={site} inspects={inspects} />)}
      <p className="mt-sub">
        <Term name="dft">Dry thickness</Term> is of the protection alone, primer deducted; the <Term name="wft">wet thickness</Term> is what a gauge reads while applying.
        {' '}{inspects ? 'Members that stay bare are listed with each zone: coating found on them is a deviation to report. What is acceptable on site is for the specification, the product’s instructions and local practice to say.' : 'The product’s own instructions govern surface, primer, conditions and curing; ask the specifier before applying anything that differs from this revision.'}
        {' '}Thicknesses rest on {site.revision?.code}; a later revision replaces it.
      </p>
    </>
  );
}

function Nothing({ projectId }: { projectId: string }) {
  const design = useMay()('see-design');
  return (
    <Panel label="Site">
      <EmptyState title="Nothing has been issued yet" action={design ? <LinkButton to={`/projects/${projectId}/schedule`} type="primary">Go to the schedule</LinkButton> : null}>
        {design ? 'The site reads issued revisions only. Prepare, check and issue the schedule; it then stands here floor by floor.' : 'Nothing is to be applied before a specifier issues the schedule. What to apply where then stands here, floor by floor. '}
        {!design && <AwaitedFrom projectId={projectId} />}
      </EmptyState>
    </Panel>
  );
}

/** The contractor's view: what to apply where, how thick and how much, from the issued revision only. */
export default function SitePage() {
  const project = useCurrentProject();
  const query = useSite(project.id);
  const site = query.data;
  const revision = site?.revision;
  const [params] = useSearchParams();
  const oneFloor = site ? site.levels.length > 1 && shownLevels(site.levels, params.get('level')).length === 1 : false;
  return (
    <Page
      title="Site" projectName={project.name} heading={site ? siteHeading(site, project.roles) : 'Site'}
      sub={revision && site?.project ? <>{site.project.number} {site.project.name}{site.project.place && `, ${site.project.place}`}. Issued {formatDate(revision.issuedAt)}. <span title={revision.pdfSha256}>PDF {revision.pdfSha256.slice(0, 12)}…</span></> : undefined}
      state={revision ? { word: 'Issued', kind: 'settled', revision: `${revision.code} issued` } : site ? { word: 'Not issued', kind: 'neutral' } : undefined}
      actions={revision ? <>
        <Button onClick={() => window.print()}>{oneFloor ? 'Print this floor' : 'Print all floors'}</Button>
        {revision.pdfAvailable && <Button href={pdfUrl(project.id, revision.id, true)} download>Specification PDF</Button>}
        <Link className="mt-noprint" to={`/projects/${project.id}/schedule/${revision.id}`}>About {revision.code}</Link>
      </> : null}
    >
      <QueryState query={query} what="the issued schedule">{(data) => (data.revision ? <Issued site={data} project={project} /> : <Nothing projectId={project.id} />)}</QueryState>
    </Page>
  );
}
