import { z } from 'zod';

type Fault = z.core.$ZodRawIssue;
const kinds: Record<string, string> = {
  string: 'text', number: 'a number', int: 'a whole number', boolean: 'true or false', array: 'a list', object: 'an object', record: 'an object', date: 'a date',
};

/** What a contract does not say itself of an input that does not fit it. */
function inWords(fault: Fault): string | undefined {
  switch (fault.code) {
    case 'invalid_type': return fault.input === undefined ? 'is needed' : `must be ${kinds[fault.expected] ?? fault.expected}`;
    case 'invalid_value': return `must be one of ${fault.values.map(String).join(', ')}`;
    case 'too_big': return tooBig(fault.origin, String(fault.maximum), fault.inclusive ?? true);
    case 'too_small': return tooSmall(fault.origin, String(fault.minimum), fault.inclusive ?? true);
    case 'invalid_format': return fault.format === 'uuid' ? 'is not an identifier' : 'is not written as it must be';
    case 'invalid_union': return 'is none of the forms that are understood';
    default: return undefined;
  }
}

function tooBig(origin: string, limit: string, inclusive: boolean): string {
  if (origin === 'string') return `is longer than ${limit} characters`;
  if (origin === 'array') return `has more than ${limit} entries`;
  return `must be ${inclusive ? 'at most' : 'below'} ${limit}`;
}

function tooSmall(origin: string, limit: string, inclusive: boolean): string {
  if (origin === 'string') return `is shorter than ${limit} characters`;
  if (origin === 'array') return `needs at least ${limit} ${limit === '1' ? 'entry' : 'entries'}`;
  return `must be ${inclusive ? 'at least' : 'above'} ${limit}`;
}

/** Lets every contract speak in these words where it has none of its own. */
export function speakInWords(): void {
  z.config({ customError: inWords });
}
