export const assessmentMessages = {
  'section.does-not-fit': (p: { part: string; givenMm: number; limitMm: number }) =>
    `${p.part} is ${Number(p.givenMm.toFixed(2))} mm; with the section's other dimensions it must be below ${Number(p.limitMm.toFixed(2))} mm. Check the dimensions.`,
  'section.radii-do-not-fit': (_: Record<string, never>) =>
    'The root and corner radii are too large for the other dimensions of the section. Check the radii; 0 stands for a sharp corner.',
  'section.web-filled': (p: { section: string }) =>
    `"Web filled" needs a space between two flanges, which ${p.section} does not have. Choose another exposure.`,
  'section.no-face': (_: Record<string, never>) => 'No face of the section sees fire. Name at least one, or take the member out of the schedule.',
};
