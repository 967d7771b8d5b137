/** The trade's words as Mantlet uses them, each with what it means here. Shown behind the word on its label, and on the Help page. */
interface Entry { word: string; group: TermGroup; sentence: string }
export const termGroups = ['Fire', 'Steel', 'Protection', 'Results', 'Quantities', 'Schedule', 'Site'] as const;
export type TermGroup = (typeof termGroups)[number];

export const terms = {
  // fire
  'zone': { word: 'Zone', group: 'Fire', sentence: 'A part of a level with one fire resistance period and one fire. Every member belongs to one.' },
  'level': { word: 'Level', group: 'Fire', sentence: 'A storey, from the top of its structural floor to the next floor or the roof.' },
  'period': { word: 'Period', group: 'Fire', sentence: 'How long the structure must carry its load in fire, in minutes, written R 60. It comes from the fire strategy.' },
  'fire-curve': { word: 'Fire curve', group: 'Fire', sentence: 'How hot the gas round the steel is, minute by minute: the standard curve, another nominal one, or a parametric one worked out for the room.' },
  'opening-factor': { word: 'Opening factor', group: 'Fire', sentence: 'How well a room is ventilated: the area of its openings times the root of their height, over the area of all its surfaces. A parametric fire depends on it.' },
  'fire-load': { word: 'Fire load', group: 'Fire', sentence: 'The heat that everything in the room would give off in burning, for each square metre of floor or of all surfaces, as stated.' },
  'thermal-inertia': { word: 'Thermal inertia', group: 'Fire', sentence: 'How readily walls, floor and ceiling take up heat: the root of density, specific heat and conductivity multiplied.' },
  'environment': { word: 'Environment', group: 'Fire', sentence: 'How corrosive the air is to steel, from C1 (heated rooms) to CX (offshore), by ISO 12944-2. A product must be assessed for it.' },
  'exposure': { word: 'Exposure', group: 'Fire', sentence: 'Which faces of the section the fire reaches: all round, three sides under a slab, or as a wall leaves it.' },
  // steel
  'mark': { word: 'Mark', group: 'Steel', sentence: 'The name of a member on the steel drawings.' },
  'section-factor': { word: 'Section factor', group: 'Steel', sentence: 'The heated surface of a metre of steel over its volume, A/V in 1/m. The higher it is, the faster the steel heats.' },
  'heated-girth': { word: 'Heated girth', group: 'Steel', sentence: 'The length of outline, round a cut through the member, that the fire reaches. The section factor is taken with it.' },
  'coated-girth': { word: 'Coated girth', group: 'Steel', sentence: 'The length of outline, round a cut through the member, that is covered with protection. The area to protect is taken with it.' },
  'utilisation': { word: 'Utilisation', group: 'Steel', sentence: 'The effect of the loads in fire over what the cold member can resist at the start of the fire. The higher it is, the cooler the steel must stay.' },
  'actions': { word: 'Actions', group: 'Steel', sentence: 'The loads on a member, permanent and variable, with their source. In fire they are combined with smaller factors than in the cold.' },
  'critical-temperature': { word: 'Critical temperature', group: 'Steel', sentence: 'The steel temperature at which the member can just carry its load in fire, written θcr. Protection has to keep the steel below it through the period.' },
  'declared': { word: 'Declared', group: 'Steel', sentence: 'A critical temperature that the structural engineer states, with a reference, instead of having it calculated from actions.' },
  'assumed': { word: 'Assumed', group: 'Steel', sentence: 'A critical temperature taken for lack of a better one. The schedule waits until the fire engineer has accepted it or the structural engineer has replaced it.' },
  // protection
  'system': { word: 'Protection system', group: 'Protection', sentence: 'The product that protects a kind of member in a zone: a coating, a board or a spray, with its own assessed data.' },
  'evidence': { word: 'Evidence', group: 'Protection', sentence: 'The assessment report that a product’s thicknesses are read from, with its edition and the day until which it is valid.' },
  'dft': { word: 'Dry film thickness', group: 'Protection', sentence: 'How thick the coating is once dry, DFT. It is of the protection alone, without primer and top coat.' },
  'wft': { word: 'Wet film thickness', group: 'Protection', sentence: 'How thick the coating is while wet, WFT: the dry thickness over the share of solids by volume. It is what a comb gauge reads during the work.' },
  'protection-form': { word: 'Protection form', group: 'Protection', sentence: 'Whether the protection follows the profile’s outline or makes a box round it. The section factor and the area depend on it.' },
  'required-thickness': { word: 'Required thickness', group: 'Protection', sentence: 'The least thickness with which this member lasts its period, read from the product’s evidence.' },
  'target-policy': { word: 'Target policy', group: 'Protection', sentence: 'How members of one system in a zone share thicknesses: each its own, a few bands, or one for all. No member ever gets less than it needs.' },
  'target': { word: 'Target protection', group: 'Protection', sentence: 'The thicknesses that a zone’s members are to get, after the target policy has grouped what each of them needs.' },
  'band': { word: 'Band', group: 'Protection', sentence: 'A group of members given one thickness, that of the member among them that needs most.' },
  'governing-member': { word: 'Governing member', group: 'Protection', sentence: 'The member that needs the greatest thickness of a system in a zone.' },
  'coat-back': { word: 'Coat-back', group: 'Protection', sentence: 'The length of an unprotected piece that is coated where it meets a protected member, so that heat does not run in along it.' },
  // results
  'settled': { word: 'Settled', group: 'Results', sentence: 'The member’s protection is determined and nothing about it waits on anybody.' },
  'bare': { word: 'May stay bare', group: 'Results', sentence: 'Without protection the steel stays at or below its critical temperature through the period. That wants a signed reason.' },
  'not-determined': { word: 'Not determined', group: 'Results', sentence: 'Something is missing, so no value can be justified. It is never taken as zero.' },
  'outside-the-assessment': { word: 'Outside the assessment', group: 'Results', sentence: 'The product’s evidence does not reach this member. Nothing is read beyond it: choose another product, section or temperature.' },
  'under-strength-cold': { word: 'Under-strength cold', group: 'Results', sentence: 'The member cannot carry its loads even without a fire. The structural engineer must change the member or its actions first.' },
  'accepted': { word: 'Accepted', group: 'Results', sentence: 'The fire engineer has signed, with a reason, for a temperature or a bare member. It lapses when the value changes.' },
  // quantities
  'takeoff': { word: 'Takeoff', group: 'Quantities', sentence: 'Measuring from the member schedule how much there is to protect and to buy: area, litres, containers, boards and mass.' },
  'net-area': { word: 'Net area', group: 'Quantities', sentence: 'The coated girth times the length, less deductions and with coat-backs added.' },
  'deduction': { word: 'Deduction', group: 'Quantities', sentence: 'Area of a member that is not covered, at a connection or where other work hides it.' },
  'waste': { word: 'Waste', group: 'Quantities', sentence: 'What is bought beyond what stays on the steel, in percent. For boards it comes from the cutting plan.' },
  'rate': { word: 'Rate', group: 'Quantities', sentence: 'The price of a unit as somebody on this project entered it. Without one, money is not determined.' },
  // schedule
  'schedule': { word: 'Schedule', group: 'Schedule', sentence: 'The list of what each member needs and gets, with what it rests on. It is issued as a PDF and cannot be changed after that.' },
  'revision': { word: 'Revision', group: 'Schedule', sentence: 'One edition of the schedule, with a code such as P02. A later issue supersedes it.' },
  'draft': { word: 'Draft', group: 'Schedule', sentence: 'The revision follows the project as it changes. Nobody may build from it.' },
  'prepared': { word: 'Prepared', group: 'Schedule', sentence: 'A specifier has frozen the schedule and signed it. Later changes in the project do not reach it.' },
  'checked': { word: 'Checked', group: 'Schedule', sentence: 'Another specifier than the one who prepared it has gone through the frozen schedule and signed it.' },
  'issued': { word: 'Issued', group: 'Schedule', sentence: 'The schedule is in force: its PDF is made once and kept, and contractor, inspector and reader see it.' },
  'superseded': { word: 'Superseded', group: 'Schedule', sentence: 'A later revision has been issued. This one is kept for the record and must not be built from.' },
  'digest': { word: 'Digest', group: 'Schedule', sentence: 'A fingerprint of a file (SHA-256). If one letter of the file changes, the digest changes with it.' },
  'design-basis': { word: 'Design basis', group: 'Schedule', sentence: 'The standards, factors and ways of reading evidence that every result of the project rests on. The fire engineer decides it.' },
  'audit-trail': { word: 'Audit trail', group: 'Schedule', sentence: 'Every change with its time, its author, and the value before and after. Nobody can edit it.' },
  // site
  'survey': { word: 'Survey', group: 'Site', sentence: 'Readings of the film thickness on finished work, set beside what the schedule asks for.' },
  'snag': { word: 'Snag', group: 'Site', sentence: 'A fault found in finished work that has to be put right before it is accepted.' },
} as const satisfies Record<string, Entry>;

export type TermName = keyof typeof terms;
export const termNames = Object.keys(terms) as TermName[];
/** Where the word stands on the Help page. */
export const termAnchor = (name: TermName): string => `term-${name}`;
