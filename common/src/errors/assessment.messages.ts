export const assessmentMessages = {
  'section.does-not-fit': (p: { part: string; givenMm: number; limitMm: number }) =>
    `${p.part} is ${Number(p.givenMm.toFixed(2))} mm; with the section's other dimensions it must be below ${Number(p.limitMm.toFixed(2))} mm. Check the dimensions.`,
  'section.radii-do-not-fit': (_: Record<string, never>) =>
    'The root and corner radii are too large for the other dimensions of the section. Check the radii; 0 stands for a sharp corner.',
  'section.web-filled': (p: { section: string }) =>
    `"Web filled" needs a space between two flanges, which ${p.section} does not have. Choose another exposure.`,
  'section.no-face': (_: Record<string, never>) => 'No face of the section sees fire. Name at least one, or take the member out of the schedule.',
  'assessment.unknown-grade': (p: { grade: string }) =>
    `Not determined: the yield strength of ${p.grade || 'a member without a grade'} is not known here. Choose a listed grade or declare the critical temperature.`,
  'assessment.too-thick-for-grade': (p: { grade: string; thicknessMm: number; limitMm: number }) =>
    `Not determined: ${p.grade} is ${p.thicknessMm} mm thick; the table of yield strengths ends at ${p.limitMm} mm. Declare the critical temperature.`,
  'assessment.no-basis': (_: Record<string, never>) =>
    'Not determined: no critical temperature, utilisation or actions given.',
  'assessment.no-actions': (_: Record<string, never>) => 'Not determined: no actions given.',
  'assessment.no-buckling-length': (p: { axis: 'y' | 'z' }) => `Not determined: no buckling length about ${p.axis}.`,
  'assessment.lateral-torsional': (_: Record<string, never>) =>
    'Not determined: lateral-torsional buckling is calculated here for I, rectangular hollow and box sections with equal flanges. Give the utilisation in fire, marked as able to buckle, or declare the temperature.',
  'assessment.no-lateral-restraint': (_: Record<string, never>) =>
    'Not determined: it is not said how the compression flange is held sideways. Say whether it is held along its length or at points only.',
  'assessment.no-lateral-spacing': (_: Record<string, never>) =>
    'Not determined: the distance between the points that hold the compression flange is missing. Give it, or describe the beam with its loads and lateral supports.',
  'assessment.cantilever-tip': (_: Record<string, never>) =>
    'Not determined: a cantilever held sideways along its length but free at its tip is not calculated here. Hold the tip too, or leave the supports along it out.',
  'assessment.composite': (_: Record<string, never>) =>
    'Not determined: a composite member is not calculated here. Give its utilisation or declare its temperature.',
  'assessment.web-openings': (_: Record<string, never>) =>
    'Not determined: a member with web openings needs a temperature declared by the structural engineer.',
  'assessment.shape-not-calculated': (p: { shape: string }) =>
    `Not determined: the resistance of ${p.shape} is not calculated here. Give its utilisation or declare its temperature.`,
  'assessment.shape-not-classified': (p: { shape: string }) =>
    `Not determined: ${p.shape} has no section class in Table 5.2 for this member. Declare its temperature.`,
  'assessment.shear-buckling': (p: { slenderness: number; limit: number }) =>
    `Not determined: the web's h/t of ${p.slenderness.toFixed(1)} is above ${p.limit.toFixed(1)}, so that it may buckle in shear, which is not calculated here. Give its utilisation in fire, marked as able to buckle, or declare its temperature.`,
  'assessment.under-strength': (p: { state: string; effect: number; resistance: number; unit: string; utilisation: number }) =>
    `Under-strength cold: the effect in fire, ${p.effect.toFixed(1)} ${p.unit}, is above the ${p.state} resistance at 20 °C, ${p.resistance.toFixed(1)} ${p.unit} (utilisation ${p.utilisation.toFixed(2)}).`,
  'assessment.under-strength-together': (p: { state: string; utilisation: number }) =>
    `Under-strength cold: axial force and bending in fire together use ${p.utilisation.toFixed(2)} of what the member carries at 20 °C (${p.state}).`,
  'assessment.under-strength-utilisation': (p: { utilisation: number }) =>
    `Under-strength cold: the utilisation given, ${p.utilisation.toFixed(2)}, is above 1.`,
  'assessment.braced-rule-for-columns': (_: Record<string, never>) =>
    'Not determined: half the storey height, and 0.7 of it at the top, are buckling lengths of braced continuous columns (EN 1993-1-2 4.2.3.2(5)); this member is not a column. Take the buckling length as given.',
  'assessment.cold-utilisation-buckling': (_: Record<string, never>) =>
    'Not determined: a cold utilisation does not say how a beam that may buckle sideways fares in fire, where a lower curve holds. Give its utilisation in fire or declare its temperature.',
  'assessment.cold-utilisation-too-high': (p: { utilisation: number; share: number }) =>
    `Not determined: η_fi times the cold utilisation is ${p.utilisation.toFixed(2)}, but by the rules for fire as little as ${p.share.toFixed(2)} of the cold resistance may be there at 20 °C. Give the utilisation in fire, the actions, or declare the temperature.`,
  'assessment.no-system': (p: { memberType: string }) => `Not determined: no system set for ${p.memberType} in this zone. Choose one for the zone.`,
  'assessment.form-mismatch': (p: { kind: string; form: string }) =>
    `Not determined: a ${p.kind} needs the protection form "${p.form}"; change the member's form or the zone's system.`,
};
