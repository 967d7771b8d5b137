export { message, messages, sentence } from './message.js';
export type { Message, MessageCode } from './message.js';
