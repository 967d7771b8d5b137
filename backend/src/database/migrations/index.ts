import { InitialSchema1764547200000 } from './1764547200000-initial-schema.js';

export const migrations = [InitialSchema1764547200000];
