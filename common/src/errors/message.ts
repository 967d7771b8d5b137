import { accountMessages } from './account.messages.js';
import { assessmentMessages } from './assessment.messages.js';
import { intakeMessages } from './intake.messages.js';
import { liveMessages } from './live.messages.js';
import { productMessages } from './product.messages.js';
import { projectMessages } from './project.messages.js';
import { scheduleMessages } from './schedule.messages.js';
import { sharedMessages } from './shared.messages.js';

/** Every code the product can say, with the sentence it says. A code without a sentence does not compile. */
export const messages = {
  ...sharedMessages,
  ...accountMessages,
  ...assessmentMessages,
  ...intakeMessages,
  ...liveMessages,
  ...productMessages,
  ...projectMessages,
  ...scheduleMessages,
} satisfies Record<string, (params: never) => string>;

export type MessageCode = keyof typeof messages;

/** A reason in a form that can be stored, compared, and said in words later. */
export interface Message<C extends MessageCode = MessageCode> {
  code: C;
  params: Parameters<(typeof messages)[C]>[0];
}

export function message<C extends MessageCode>(code: C, params: Parameters<(typeof messages)[C]>[0]): Message<C> {
  return { code, params };
}

/** The sentence of a message; a code this version does not know is shown as it stands. */
export function sentence(m: { code: string; params: unknown }): string {
  const say = (messages as Record<string, (params: never) => string>)[m.code];
  return say ? say(m.params as never) : m.code;
}
