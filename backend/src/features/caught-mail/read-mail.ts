/** As much of a mail as the product itself writes: subject, recipient and the plain text. */
export interface ReadMail {
  to: string;
  subject: string;
  text: string;
}

export function readMail(raw: string): ReadMail {
  const { headers, body } = split(raw);
  return { to: inWords(headers.get('to') ?? ''), subject: inWords(headers.get('subject') ?? ''), text: plainText(headers, body).replace(/\r\n/g, '\n') };
}

function split(raw: string): { headers: Map<string, string>; body: string } {
  const end = /\r?\n\r?\n/.exec(raw);
  const head = end ? raw.slice(0, end.index) : raw;
  const lines = head.replace(/\r?\n[ \t]+/g, ' ').split(/\r?\n/);
  const headers = new Map(lines.map((line): [string, string] => {
    const colon = line.indexOf(':');
    return [line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim()];
  }));
  return { headers, body: end ? raw.slice(end.index + end[0].length) : '' };
}

function plainText(headers: Map<string, string>, body: string): string {
  const type = headers.get('content-type') ?? 'text/plain';
  const boundary = /boundary="?([^";]+)"?/i.exec(type)?.[1];
  if (!boundary) return decode(body, headers.get('content-transfer-encoding')).trim();
  const parts = body.split(`--${boundary}`).slice(1, -1).map((part) => split(part.replace(/^\r?\n/, '')));
  const plain = parts.find((part) => (part.headers.get('content-type') ?? '').startsWith('text/plain'));
  return plain ? plainText(plain.headers, plain.body) : '';
}

function decode(body: string, encoding = '7bit'): string {
  if (/base64/i.test(encoding)) return Buffer.from(body, 'base64').toString('utf8');
  return /quoted-printable/i.test(encoding) ? quoted(body.replace(/=\r?\n/g, '')) : body;
}

const quoted = (text: string): string =>
  Buffer.from(text.replace(/=([0-9a-f]{2})/gi, (_, hex: string) => String.fromCharCode(parseInt(hex, 16))), 'latin1').toString('utf8');

/** =?UTF-8?Q?…?= and =?UTF-8?B?…?= (RFC 2047) */
function inWords(header: string): string {
  return header
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([qb])\?([^?]*)\?=/gi, (_, way: string, text: string) =>
      way.toLowerCase() === 'b' ? Buffer.from(text, 'base64').toString('utf8') : quoted(text.replace(/_/g, ' ')));
}
