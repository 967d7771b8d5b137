/** The look as data: one palette a ground. Two colours carry meaning (settled, attention); the rest is paper, ink and line. */
export interface Palette {
  paper: string; sheet: string;
  ink: string; ink2: string;
  /** for drawing aids only: too faint for text */
  ink3: string;
  line: string; line2: string;
  settled: string; settledTint: string;
  attention: string;
  /** as light as text in the colour of attention needs it: 4.5 to 1 */
  attentionTint: string;
  /** behind what the pointer is over */
  hover: string;
}
export const light: Palette = {
  paper: '#F5F1E6', sheet: '#FFFDF8', ink: '#1C2325', ink2: '#566063', ink3: '#8B9292', line: '#D8D1BF', line2: '#ECE6D6',
  settled: '#1D6A5A', settledTint: '#DCEAE3', attention: '#B5451B', attentionTint: '#F8E6DA', hover: '#F1ECDE',
};
export const dark: Palette = {
  paper: '#121718', sheet: '#1A2021', ink: '#EDE8DB', ink2: '#A9B0AD', ink3: '#737C7B', line: '#39423F', line2: '#262E2D',
  settled: '#6FBFA9', settledTint: '#1F3A34', attention: '#EE9468', attentionTint: '#43271B', hover: '#222A2B',
};

const declarations = (p: Palette) => [
  `--paper:${p.paper}`, `--sheet:${p.sheet}`, `--ink:${p.ink}`, `--ink-2:${p.ink2}`, `--ink-3:${p.ink3}`, `--line:${p.line}`, `--line-2:${p.line2}`,
  `--settled:${p.settled}`, `--settled-tint:${p.settledTint}`, `--attention:${p.attention}`, `--attention-tint:${p.attentionTint}`, `--hover:${p.hover}`,
].join(';');

/** Where the system forces its colours, drawings follow: words, hatch and marks still carry what colour repeats. */
const forced = `--paper:Canvas;--sheet:Canvas;--ink:CanvasText;--ink-2:CanvasText;--ink-3:GrayText;--line:CanvasText;--line-2:GrayText;` +
  `--settled:CanvasText;--settled-tint:Canvas;--attention:CanvasText;--attention-tint:Canvas;--hover:Canvas`;

/** Custom properties for both grounds. Paper prints light whatever the screen shows. */
export const paletteCss = `:root{${declarations(light)};color-scheme:light}
@media screen{:root[data-ground="dark"]{${declarations(dark)};color-scheme:dark}}
@media (forced-colors:active){:root,:root[data-ground]{${forced}}}`;
