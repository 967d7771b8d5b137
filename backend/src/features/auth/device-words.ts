/** first match wins: many browsers name others as well */
const browsers: [RegExp, string][] = [
  [/\bEdgA?\/|\bEdgiOS\//, 'Edge'], [/\bOPR\//, 'Opera'], [/\bFirefox\/|\bFxiOS\//, 'Firefox'],
  [/(\b|Headless)Chrome\/|\bCriOS\/|\bChromium\//, 'Chrome'], [/\bVersion\/.*\bSafari\//, 'Safari'],
];
const systems: [RegExp, string][] = [
  [/\bAndroid\b/, 'Android'], [/\biPhone\b/, 'an iPhone'], [/\biPad\b/, 'an iPad'], [/\bWindows\b/, 'Windows'], [/\bMac OS X\b|\bMacintosh\b/, 'a Mac'],
  [/\bCrOS\b/, 'ChromeOS'], [/\bLinux\b/, 'Linux'],
];
const find = (list: [RegExp, string][], text: string): string | undefined => list.find(([sign]) => sign.test(text))?.[1];

/** "Firefox on Linux": what the browser says of itself, which is a hint for its owner and proves nothing. */
export function deviceInWords(userAgent: string): string {
  const browser = find(browsers, userAgent);
  const system = find(systems, userAgent);
  if (!browser && !system) return 'A device that does not say what it is';
  return `${browser ?? 'A browser'} on ${system ?? 'a system it does not name'}`;
}
