/** Said when members are written, and when a schedule is read. */
const many = (count: number, one: string, several = `${one}s`): string => (count === 1 ? `1 ${one}` : `${count} ${several}`);
const listed = (names: readonly string[], most = 5): string =>
  names.length > most ? `${names.slice(0, most).join(', ')} and ${names.length - most} more` : names.join(', ');

export const intakeMessages = {
  // members
  'member.mark-taken': (p: { mark: string; zone: string; level: string }) =>
    `Mark ${p.mark} is taken by a member in zone ${p.zone} on level ${p.level}. Give this one another mark, or open that one.`,
  'member.zone-unknown': (_: Record<string, never>) => 'This zone is not one of the project. Choose a zone from the list.',
  'member.section-unknown': (_: Record<string, never>) => 'This section is neither in the catalogue nor one of the project. Choose one from the list.',
  'member.some-unknown': (p: { count: number }) =>
    `${many(p.count, 'of the members is', 'of the members are')} no longer in this project. Nothing was changed; reload the list and try again.`,
  'member.moved': (p: { marks: string[] }) =>
    `${listed(p.marks)} ${p.marks.length === 1 ? 'was' : 'were'} changed by somebody since you chose ${p.marks.length === 1 ? 'it' : 'them'}. Nothing was changed; look at ${p.marks.length === 1 ? 'it' : 'them'} again and repeat.`,
  'member.found-moved': (p: { then: number; now: number }) =>
    p.then === p.now
      ? `Some of the ${p.then} members found were changed since you looked. Nothing was changed; look at the list again and repeat.`
      : `${p.then} members were found when you looked, ${p.now} are now. Nothing was changed; look at the list again and repeat.`,
  'member-view.name-taken': (p: { name: string }) => `You have a list called ${p.name} already. Give this one another name, or change that one.`,
  'member-view.too-many': (p: { most: number }) => `You keep ${p.most} lists on this project already. Delete one before you keep another.`,
  'member.not-assumed': (p: { marks: string[] }) =>
    `Nothing was accepted: ${listed(p.marks)} ${p.marks.length === 1 ? 'does' : 'do'} not rest on an assumed temperature.`,
  'member.not-high': (p: { marks: string[]; aboveC: number }) =>
    `Nothing was accepted: ${listed(p.marks)} ${p.marks.length === 1 ? 'has' : 'have'} no critical temperature above ${p.aboveC} °C.`,
  'member.not-bare': (p: { marks: string[] }) =>
    `Nothing was accepted: ${listed(p.marks)} ${p.marks.length === 1 ? 'is' : 'are'} not found to withstand the fire bare.`,

  // the file
  'import.no-file': (_: Record<string, never>) => 'No file came with the request. Choose a CSV or XLSX file.',
  'import.too-large': (p: { limitMb: number }) => `The file is larger than ${p.limitMb} MB. Split the schedule, or save it without pictures.`,
  'import.empty-file': (p: { file: string }) => `${p.file} is empty.`,
  'import.not-a-schedule': (p: { file: string; kind: string }) =>
    `${p.file} is ${p.kind}, not a CSV or XLSX file. Save the schedule as CSV or XLSX and upload that.`,
  'import.bomb': (p: { file: string; limitMb: number }) =>
    `${p.file} unpacks to more than ${p.limitMb} MB or holds far more than a schedule does, and was not opened.`,
  'import.damaged': (p: { file: string }) => `${p.file} is damaged or protected by a password and could not be read. Save it again as XLSX or CSV.`,
  'import.too-many-rows': (p: { file: string; sheet: string; rows: number; limit: number }) =>
    `${p.file}, sheet "${p.sheet}": content in row ${p.rows}; at most ${p.limit} rows are read. Split the schedule.`,
  'import.too-many-cells': (p: { file: string; limit: number }) => `${p.file} holds more than ${p.limit} cells. Split the schedule.`,
  'import.too-much-text': (p: { file: string; limit: number }) => `${p.file} holds more than ${p.limit} characters of text. Split the schedule.`,
  'import.quote-open': (p: { file: string; line: number }) =>
    `${p.file}, line ${p.line}: a quotation mark is opened and not closed as CSV asks for. Correct that line and upload again.`,
  'import.no-content': (p: { file: string }) => `${p.file} holds no rows. Nothing to import.`,
  'import.only-headers': (p: { sheet: string; row: number }) => `Sheet "${p.sheet}" has no rows below its headers in row ${p.row}. Nothing to import.`,

  // headers
  'import.duplicate-header': (p: { header: string; row: number; columns: string[]; field: string }) =>
    `Row ${p.row}: columns ${p.columns.join(' and ')} are both headed "${p.header}". Choose which of them holds ${p.field}.`,
  'import.second-column': (p: { header: string; column: string; field: string; chosen: string }) =>
    `Column ${p.column}, "${p.header}", was left aside: ${p.field} is read from column ${p.chosen}.`,
  'import.column-not-read': (p: { headers: string[] }) =>
    `Not understood and not read: ${listed(p.headers, 12)}. Assign ${p.headers.length === 1 ? 'it' : 'them'} by hand if needed.`,
  'import.missing-column': (p: { fields: string[] }) =>
    `No column was recognised for ${listed(p.fields, 12)}. Choose the column, or a value for all rows where there is one.`,
  'import.no-headers': (p: { sheet: string }) => `Sheet "${p.sheet}": no row of headers was recognised. Say which row it is, and choose the columns.`,
  'import.length-unit-guessed': (p: { unit: string }) =>
    `The file does not say in which unit lengths are; they look like ${p.unit === 'm' ? 'metres' : 'millimetres'}. Check the unit.`,
  'import.structural-ignored': (p: { fields: string[] }) =>
    `${listed(p.fields)} ${p.fields.length === 1 ? 'is' : 'are'} not read: only the structural engineer may set how a member's critical temperature comes about.`,
  'import.encoding-guessed': (p: { encoding: string }) => `The file is not UTF-8 and was read as ${p.encoding}. Check letters with accents.`,

  // mapping
  'import.no-such-sheet': (p: { sheet: string; sheets: string[] }) => `There is no sheet "${p.sheet}". The file has ${listed(p.sheets.map((s) => `"${s}"`))}.`,
  'import.no-such-row': (p: { row: number; rows: number }) => `Row ${p.row} cannot be the headers: the sheet ends at row ${p.rows}.`,
  'import.no-such-column': (p: { field: string; column: string }) => `${p.field}: the sheet has no column ${p.column}.`,
  'import.column-twice': (p: { column: string; fields: string[] }) => `Column ${p.column} is chosen for ${p.fields.join(' and for ')}. Choose one of them.`,
  'import.mark-needed': (_: Record<string, never>) => 'Choose the column that holds the mark: without marks no row can be told from another.',
  'import.needed-for-new': (p: { fields: string[]; count: number }) =>
    `${listed(p.fields, 12)}: no column${p.fields.length === 1 ? ' is' : 's are'} chosen, and ${many(p.count, 'row is a new member', 'rows are new members')} that ${p.count === 1 ? 'needs' : 'need'} ${p.fields.length === 1 ? 'it' : 'them'}. Choose the column, or a value for new members below the rows.`,

  // rows
  'import.row-needed': (p: { field: string }) => `${p.field} is needed; the cell is empty.`,
  'import.row-too-long': (p: { field: string; limit: number }) => `${p.field} is longer than ${p.limit} characters.`,
  'import.row-not-a-number': (p: { text: string; field: string }) => `"${p.text}" is not a number. ${p.field} must be a number.`,
  'import.row-ambiguous-number': (p: { text: string; one: string; other: string }) =>
    `"${p.text}" may mean ${p.one} or ${p.other}. Write it without a thousands separator.`,
  'import.row-formula-error': (p: { text: string }) => `The cell's formula gives ${p.text}. Correct it in the schedule.`,
  'import.row-not-above-zero': (p: { field: string; text: string }) => `${p.field} must be above 0; it is ${p.text}.`,
  'import.row-not-whole': (p: { field: string; text: string }) => `${p.field} must be a whole number; it is ${p.text}.`,
  'import.row-outside': (p: { field: string; text: string; least: string; greatest: string }) =>
    `${p.field} is ${p.text}; it must lie between ${p.least} and ${p.greatest}.`,
  'import.row-feet-inches': (p: { text: string }) => `"${p.text}" is not a length in feet and inches such as 12'-6".`,
  'import.row-unknown-section': (p: { text: string; suggestions: string[] }) =>
    p.suggestions.length
      ? `There is no section "${p.text}". Did you mean ${p.suggestions.join(', ')}?`
      : `There is no section "${p.text}". Correct its name, or make it as a section of the project first.`,
  'import.row-unknown-word': (p: { field: string; text: string; known: string[] }) =>
    `"${p.text}" is not known as ${p.field.toLowerCase()}. Known: ${listed(p.known, 12)}.`,
  'import.row-faces': (p: { text: string }) =>
    `"${p.text}" does not say which faces see fire. Name them, such as "bottom, left", or choose another exposure.`,
  'import.row-unknown-place': (p: { what: 'zone' | 'level'; text: string; known: string[] }) =>
    p.known.length ? `There is no ${p.what} "${p.text}". The project has ${listed(p.known, 8)}.` : `There is no ${p.what} "${p.text}"; the project has none yet.`,
  'import.row-zone-elsewhere': (p: { zone: string; level: string; given: string }) => `Zone ${p.zone} lies on level ${p.level}, not on ${p.given}.`,
  'import.row-zone-unclear': (p: { level: string; zones: string[] }) =>
    p.zones.length ? `Level ${p.level} has the zones ${listed(p.zones, 8)}. Say which one.` : `Level ${p.level} has no zone yet.`,
  'import.row-zone-several': (p: { text: string; zones: string[] }) => `"${p.text}" is the name of more than one zone: ${listed(p.zones, 8)}. Use the code.`,
  'import.row-mark-twice': (p: { mark: string; rows: number[] }) =>
    `Mark ${p.mark} also stands in row ${p.rows.slice(0, 5).join(', ')}. A mark names one member; use "number off" for identical ones.`,
  'import.row-two-temperatures': (_: Record<string, never>) => 'A critical temperature and a utilisation are both given. Give one of them.',
  'import.row-no-reference': (_: Record<string, never>) => 'Say where the value comes from: the reference is empty.',
  'import.skipped-total': (p: { rows: number[] }) =>
    `${p.rows.length === 1 ? 'Row' : 'Rows'} ${listed(p.rows.map(String), 8)} ${p.rows.length === 1 ? 'looks like a total and was' : 'look like totals and were'} not read.`,
  'import.skipped-headers': (p: { rows: number[] }) =>
    `${p.rows.length === 1 ? 'Row' : 'Rows'} ${listed(p.rows.map(String), 8)} ${p.rows.length === 1 ? 'repeats' : 'repeat'} the headers and ${p.rows.length === 1 ? 'was' : 'were'} not read.`,

  // confirming
  'import.over': (p: { state: string }) =>
    p.state === 'confirmed' ? 'This import was confirmed already; its members are in the project.' : 'This import was given up. Upload the file again.',
  'import.map-first': (_: Record<string, never>) => 'Confirm which column holds what first; then the rows can be checked.',
  'import.wrong-rows': (p: { count: number; row: number; column: string; problem: string }) =>
    `Nothing was written: ${many(p.count, 'row is', 'rows are')} wrong. Row ${p.row}, ${p.column}: ${p.problem} Correct the file, or leave out the wrong rows.`,
  'import.nothing-to-write': (_: Record<string, never>) => 'Nothing was written: no row is right. Correct the file and upload it again.',
  'import.changed-meanwhile': (_: Record<string, never>) =>
    'Nothing was written: the project was changed after this preview, and the outcome would differ. Look at the new preview and confirm again.',
};
