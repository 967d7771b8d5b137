import { fireSets } from './fire.cases.js';
import { heatingSets } from './heating.cases.js';
import { materialSets } from './material.cases.js';
import { memberSets } from './member.cases.js';
import type { ValidationSet } from './validation-case.js';

export const validationSets: ValidationSet[] = [...materialSets, ...fireSets, ...heatingSets, ...memberSets];
