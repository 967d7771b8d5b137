import { roleNames, roles } from '@mantlet/common';
import { roleDecides } from '../../../lib/role-words.js';
import './role-options.css';

/** The roles of a project to choose from, each with what it decides. */
export const roleOptions = roles.map((value) => ({ value, label: <>{roleNames[value]}<span className="mt-sub mt-role-says">{roleDecides[value]}</span></> }));
