import { roleNames } from '@mantlet/common';
import type { BuildingDto, MembershipDto, ProjectDto, Role, ZoneDto } from '@mantlet/common';
import { count, formatNumber, joinWords } from '../../lib/format.js';
import type { Right } from '../../lib/may.js';

export interface FirstStep { key: string; title: string; how: string; done: boolean; /** how far it is, in words */ state: string; right: Right; to: string; link: string }

const withoutTemperature = new Set(['assessment.no-basis', 'assessment.no-actions']);
/** Members that nobody has given actions or a temperature yet. */
const waitingForActions = (building: Pick<BuildingDto, 'openItems'>) =>
  building.openItems.filter((i) => withoutTemperature.has(i.code)).reduce((sum, i) => sum + i.count, 0);

/** Without one of these a step has nobody to take it. */
const needed: readonly Role[] = ['fire-engineer', 'structural-engineer', 'specifier'];
type Team = readonly Pick<MembershipDto, 'roles'>[];
const rolesMissing = (team: Team) => needed.filter((role) => !team.some((person) => person.roles.includes(role)));
const article = (role: Role) => `a ${roleNames[role].toLowerCase()}`;

/** From an empty project to the first settled member, in the order in which one step needs the other. */
export function firstSteps(project: Pick<ProjectDto, 'counts'>, building: Pick<BuildingDto, 'members' | 'openItems'>, zones: readonly Pick<ZoneDto, 'systems' | 'members'>[], team: Team): FirstStep[] {
  const { counts } = project;
  const members = building.members;
  const missing = waitingForActions(building);
  const inUse = zones.filter((z) => z.members > 0);
  const withSystem = inUse.filter((z) => z.systems.length > 0).length;
  const absent = rolesMissing(team);
  return [
    { key: 'team', title: 'Bring the team together', how: absent.length ? `Still without ${joinWords(absent.map(article))}. Who has an account is added by e-mail address; the administrator invites the others.` : 'A second specifier checks what the first prepares.', done: absent.length === 0, state: count(team.length, 'person', 'people'), right: 'edit-team', to: 'team', link: 'Go to the team' },
    { key: 'levels', title: 'Draw up the levels', how: 'A code, a name and the height above the datum, from the lowest up.', done: counts.levels > 0, state: counts.levels ? count(counts.levels, 'level') : 'none yet', right: 'edit-levels', to: 'zones', link: 'Go to the zones' },
    { key: 'zones', title: 'Divide each level into zones', how: 'Each with its period and fire curve, and where the fire strategy says so.', done: counts.zones > 0, state: counts.zones ? count(counts.zones, 'zone') : 'none yet', right: 'edit-zones', to: 'zones', link: 'Go to the zones' },
    { key: 'members', title: 'Bring in the member schedule', how: 'As CSV or XLSX from whoever draws the steel; a few members can be typed in.', done: members > 0, state: members ? count(members, 'member') : 'none yet', right: 'import-members', to: 'members/import', link: 'Import members' },
    { key: 'actions', title: 'Give the members their actions', how: 'Actions, a utilisation, or a declared critical temperature, each with its reference.', done: members > 0 && missing === 0, state: members === 0 ? 'none yet' : `${formatNumber(members - missing)} of ${formatNumber(members)} members`, right: 'edit-structural', to: 'members?open=true', link: 'Open the members' },
    { key: 'products', title: 'Enter the protection products', how: 'Each with its assessment: reference, edition, expiry and data. What the administrator keeps in the shared library is here already.', done: counts.products > 0, state: counts.products ? count(counts.products, 'product') : 'none yet', right: 'edit-products', to: 'products', link: 'Go to the products' },
    { key: 'systems', title: 'Choose the protection', how: 'Environment, a system for each kind of member, and the target policy, zone by zone.', done: inUse.length > 0 && withSystem === inUse.length, state: inUse.length ? `${withSystem} of ${count(inUse.length, 'zone')}` : 'none yet', right: 'edit-protection', to: 'zones', link: 'Go to the zones' },
  ];
}
