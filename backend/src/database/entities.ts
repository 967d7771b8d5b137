import { MemberResult } from '../features/assessment/member-result.entity.js';
import { ZoneResult } from '../features/assessment/zone-result.entity.js';
import { AuditEntry } from '../features/audit/audit-entry.entity.js';
import { MemberImport } from '../features/imports/member-import.entity.js';
import { Job } from '../features/jobs/job.entity.js';
import { Mail } from '../features/mail/mail.entity.js';
import { Level } from '../features/levels/level.entity.js';
import { MemberAcceptance } from '../features/members/member-acceptance.entity.js';
import { MemberView } from '../features/members/member-view.entity.js';
import { Member } from '../features/members/member.entity.js';
import { Membership } from '../features/memberships/membership.entity.js';
import { Product } from '../features/products/product.entity.js';
import { Project } from '../features/projects/project.entity.js';
import { Revision } from '../features/revisions/revision.entity.js';
import { Section } from '../features/sections/section.entity.js';
import { AccountLinkRecord } from '../features/users/account-link.entity.js';
import { User } from '../features/users/user.entity.js';
import { ZoneSystem } from '../features/zones/zone-system.entity.js';
import { Zone } from '../features/zones/zone.entity.js';

export const entities = [
  User, Project, Membership, Level, Zone, ZoneSystem, Section, Product, Member, MemberAcceptance, MemberResult, ZoneResult,
  Revision, MemberImport, AuditEntry, Job, MemberView, AccountLinkRecord, Mail,
];
