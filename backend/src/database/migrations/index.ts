import { InitialSchema1764547200000 } from './1764547200000-initial-schema.js';
import { Accounts1764633600000 } from './1764633600000-accounts.js';
import { Jobs1764633700000 } from './1764633700000-jobs.js';
import { MemberViews1764633800000 } from './1764633800000-member-views.js';
import { DescribedBeams1764633900000 } from './1764633900000-described-beams.js';
import { RestraintSaid1764634000000 } from './1764634000000-restraint-said.js';

export const migrations = [InitialSchema1764547200000, Accounts1764633600000, Jobs1764633700000, MemberViews1764633800000, DescribedBeams1764633900000, RestraintSaid1764634000000];
