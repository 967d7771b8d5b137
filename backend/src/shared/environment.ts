/** Settings come from the environment; the start command sets them. None has a secret default. */
function required(name: string): string {
  const value = process.env[name];
  if (!value) throw new Error(`${name} is not set. Use npm start, which sets it, or see DEVELOPERS.md.`);
  return value;
}

export const databaseUrl = (): string => required('MANTLET_DATABASE_URL');
export const sessionSecret = (): string => required('MANTLET_SESSION_SECRET');
export const port = (): number => Number(process.env['PORT'] ?? 4700);
export const host = (): string => process.env['HOST'] ?? '127.0.0.1';
/** how many members a change may touch to be worked out within it; more are left to a worker */
export const recalculateInPlaceMax = (): number => Number(process.env['MANTLET_RECALCULATE_IN_PLACE_MAX'] ?? 5000);
/** where the built client lies; unset in tests of the API alone */
export const clientDir = (): string | undefined => process.env['MANTLET_CLIENT_DIR'];
/** behind TLS the cookie must be secure */
export const secureCookies = (): boolean => process.env['MANTLET_SECURE_COOKIES'] === '1';

/** smtp://… or smtps://…, with name and password where the mail server wants them; unset, no mail is sent */
export const smtpUrl = (): string | undefined => process.env['MANTLET_SMTP_URL'] || undefined;
export const mailFrom = (): string => process.env['MANTLET_MAIL_FROM'] || 'Mantlet <mantlet@localhost>';
/** where a local fake writes mail, on demonstration and development servers */
export const caughtMailDir = (): string | undefined => process.env['MANTLET_CAUGHT_MAIL_DIR'] || undefined;
/** else whoever sits at this machine reads it alone */
export const caughtMailForEverybody = (): boolean => process.env['MANTLET_CAUGHT_MAIL_FOR_EVERYBODY'] === '1';
/** The address at which people reach this installation; mailed links begin with it. */
export function publicUrl(): string {
  const given = process.env['MANTLET_PUBLIC_URL'];
  if (given && !(URL.canParse(given) && /^https?:$/.test(new URL(given).protocol))) throw new Error(`MANTLET_PUBLIC_URL is “${given}”. Give an address such as https://mantlet.example.test.`);
  return given || `http://${['0.0.0.0', '::'].includes(host()) ? 'localhost' : host()}:${port()}`;
}
