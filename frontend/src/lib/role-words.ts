import type { Role } from '@mantlet/common';

/** What each role decides on a project, and what it must leave to others. */
export const roleDecides: Record<Role, string> = {
  'fire-engineer': 'Decides levels, zones, periods, fires and the design basis; accepts assumed and high temperatures and bare members.',
  'structural-engineer': 'Decides each member’s actions, restraint, utilisation or declared critical temperature, with its reference.',
  'specifier': 'Decides sections, exposure, protection form, systems and target policy; prepares, checks and issues, never checking their own work.',
  'contractor': 'Reads what is issued: what to apply where, how thick, and what to bring. Sees prices only if they are given.',
  'inspector': 'Reads what is issued and holds the work against it: thickness, faces and what stays bare, zone by zone.',
  'reader': 'Reads what is issued, and changes nothing.',
};

export interface RoleStep { text: string; /** page of the project, '' for its front page */ page: string; pageName: string }
/** The part of each role from first sign-in to done, in the order in which it is done. */
export const roleSteps: Record<Role, readonly RoleStep[]> = {
  'fire-engineer': [
    { text: 'Set the design basis: factors, the way a temperature is found from a utilisation, assumed temperatures.', page: 'team', pageName: 'Team and basis' },
    { text: 'Draw up the levels from the lowest up, then the zones on each with period, fire curve and where the fire strategy says so.', page: 'zones', pageName: 'Zones' },
    { text: 'Go through what waits on you: assumed or high temperatures and bare members, each accepted with a reason or sent back.', page: '', pageName: 'Building' },
  ],
  'structural-engineer': [
    { text: 'Filter the members to those that have no actions, or import them with the member schedule.', page: 'members', pageName: 'Members' },
    { text: 'Give each member its actions, utilisation or declared temperature, with the calculation it comes from.', page: 'members', pageName: 'Members' },
    { text: 'Settle what waits on you: members not determined, and those that fail cold.', page: '', pageName: 'Building' },
  ],
  'specifier': [
    { text: 'Bring in the member schedule, and set exposure and protection form.', page: 'members', pageName: 'Members' },
    { text: 'Choose environment, systems and target policy of each zone.', page: 'zones', pageName: 'Zones' },
    { text: 'Settle what waits on you, then start a revision, prepare it, have another specifier check it, and issue it.', page: 'schedule', pageName: 'Schedule' },
  ],
  'contractor': [
    { text: 'Read what to buy for the job, and floor by floor what to apply to which member, how thick, on which faces.', page: 'site', pageName: 'Site' },
    { text: 'Print a floor, or download the specification as issued.', page: 'site', pageName: 'Site' },
  ],
  'inspector': [
    { text: 'Print the floor you are going to inspect: every member with its thickness and the faces to protect.', page: 'site', pageName: 'Site' },
    { text: 'See that the revision in your hand is the one in force, and that its PDF is the file that was issued.', page: 'schedule', pageName: 'Schedule' },
  ],
  'reader': [
    { text: 'Read the issued schedule and its signatures, and verify its PDF.', page: 'schedule', pageName: 'Schedule' },
    { text: 'See floor by floor what each member gets.', page: 'site', pageName: 'Site' },
  ],
};

/** The administrator stands outside the projects. */
export const administratorSteps: readonly string[] = [
  'Invite people under Accounts; each sets a password by the link in the mail.',
  'Keep the shared product library: evidence with its edition, expiry and file.',
  'A project is read only by its team, so that being administrator opens none of them.',
];
