/** Projects, their team, levels, zones and sections. */
export const projectMessages = {
  'section.no-name': (p: { name: string }) =>
    `"${p.name}" cannot name a section: it needs letters or numbers by which a schedule can call it.`,
  'project.take-a-leading-role': (_: Record<string, never>) =>
    "Take the fire engineer's or the specifier's role: without either, nobody could bring the others onto the team. It can be handed on later.",
  'team.no-account': (p: { email: string }) =>
    `Nobody has an account with the e-mail address ${p.email}. Ask the administrator to invite the person; once they have chosen a password, add them here.`,
  'team.already-on': (p: { name: string }) => `${p.name} is on the team already. Change their roles in the list instead.`,
  'team.needs-a-lead': (_: Record<string, never>) =>
    "The team must keep at least one fire engineer or specifier, or nobody could change it any more. Give that role to another person first.",
  'level.has-zones': (p: { level: string; zones: string }) =>
    `Level ${p.level} still holds ${p.zones}. Move the zones to another level or delete them first.`,
  'zone.has-members': (p: { zone: string; members: number }) =>
    `Zone ${p.zone} still holds ${p.members} ${p.members === 1 ? 'member' : 'members'}. Move them to another zone or delete them first.`,
  'zone.system-twice': (p: { memberType: string }) => `Two systems are given for ${p.memberType}. A zone has one for each member type.`,
  'zone.no-such-product': (p: { memberType: string }) =>
    `The product chosen for ${p.memberType} is neither in the shared library nor one of this project. Choose another.`,
  'zone.no-such-level': (_: Record<string, never>) => 'The level chosen is not a level of this project. Choose another.',
};
