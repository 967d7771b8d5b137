/** Bytes of a text file as text; null where they are no text. */
export interface DecodedText {
  text: string;
  /** set where the encoding is a guess that the reader should check */
  guessed: string | null;
}

/** UTF-8 and UTF-16 by their byte order mark or by how zero bytes lie; else UTF-8 if valid, else Windows-1252 (Western European). */
export function decodeText(content: Buffer): DecodedText | null {
  const encoding = utf16Order(content);
  const decoded = encoding ? { text: new TextDecoder(encoding).decode(content), guessed: null } : decodeBytes(content);
  return looksLikeText(decoded.text) ? decoded : null;
}

function utf16Order(content: Buffer): 'utf-16le' | 'utf-16be' | null {
  if (content[0] === 0xff && content[1] === 0xfe) return 'utf-16le';
  if (content[0] === 0xfe && content[1] === 0xff) return 'utf-16be';
  const sample = content.subarray(0, 400);
  let even = 0;
  let odd = 0;
  sample.forEach((byte, i) => {
    if (byte === 0) {
      if (i % 2) odd += 1;
      else even += 1;
    }
  });
  const half = sample.length / 2;
  if (sample.length >= 8 && odd > 0.7 * half && even === 0) return 'utf-16le';
  if (sample.length >= 8 && even > 0.7 * half && odd === 0) return 'utf-16be';
  return null;
}

function decodeBytes(content: Buffer): DecodedText {
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(content), guessed: null };
  } catch {
    return { text: new TextDecoder('windows-1252').decode(content), guessed: 'Windows-1252' };
  }
}

/** Zero bytes never, other control characters hardly ever, occur in text. */
function looksLikeText(text: string): boolean {
  if (text.includes('\0')) return false;
  const sample = text.slice(0, 4000);
  // eslint-disable-next-line no-control-regex
  const odd = sample.match(/[\x01-\x08\x0e-\x1a\x1c-\x1f\ufffd]/g)?.length ?? 0;
  return odd <= sample.length / 50;
}
