import { NavLink } from 'react-router-dom';
import type { ProjectDto } from '@mantlet/common';
import { formatNumber } from '../lib/format.js';
import { may } from '../lib/may.js';

interface Entry { to: string; label: string; count?: string; end?: boolean }

/** Readers, inspectors and contractors see issued work only, so their list is short. */
export function projectEntries(project: ProjectDto): Entry[][] {
  const at = `/projects/${project.id}`;
  const { counts } = project;
  const issued = project.issuedRevision?.code;
  if (!may(project.roles, 'see-design')) {
    return [[{ to: at, label: 'Building', end: true }, { to: `${at}/site`, label: 'Site', ...(issued ? { count: issued } : {}) }, { to: `${at}/schedule`, label: 'Schedule', ...(issued ? { count: issued } : {}) }]];
  }
  return [
    [
      { to: at, label: 'Building', end: true },
      { to: `${at}/zones`, label: 'Zones', count: formatNumber(counts.zones) },
      { to: `${at}/members`, label: 'Members', count: formatNumber(counts.members) },
      { to: `${at}/products`, label: 'Products', count: formatNumber(counts.products) },
    ],
    [
      { to: `${at}/quantities`, label: 'Quantities' },
      { to: `${at}/schedule`, label: 'Schedule', ...(project.revision ? { count: project.revision.code } : {}) },
      { to: `${at}/site`, label: 'Site', ...(issued ? { count: issued } : {}) },
    ],
    [{ to: `${at}/team`, label: 'Team and basis' }],
  ];
}

export function generalEntries(administrator: boolean): Entry[][] {
  return [[
    { to: '/projects', label: 'Projects', end: true },
    { to: '/products', label: 'Product library' },
    ...(administrator ? [{ to: '/accounts', label: 'Accounts' }] : []),
  ]];
}

const help: Entry = { to: '/help', label: 'Help' };

export function PageList({ project, administrator, onGo }: { project: ProjectDto | undefined; administrator: boolean; onGo?: () => void }) {
  const groups = project
    ? [...projectEntries(project), [{ to: '/projects', label: 'All projects', end: true }, help]]
    : [...generalEntries(administrator), [help]];
  return (
    <nav className="mt-nav" aria-label="Pages">
      {groups.map((group) => (
        <ul key={group[0]?.to}>
          {group.map((entry) => (
            <li key={entry.to}>
              <NavLink to={entry.to} end={entry.end ?? false} {...(onGo ? { onClick: onGo } : {})}>
                <span>{entry.label}</span>
                {'count' in entry && entry.count ? <span className="mt-nav-count">{entry.count}</span> : null}
              </NavLink>
            </li>
          ))}
        </ul>
      ))}
    </nav>
  );
}
