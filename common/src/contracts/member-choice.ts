import { z } from 'zod';
import { memberNarrowingSchema } from './member-list.js';
import { idSchema, versionSchema } from './primitives.js';

/**
 * Members to do something with: chosen one by one, each as it was seen, or all that a filter finds, with the number and the stamp
 * under which they were shown. Where either has moved meanwhile nothing is done.
 */
export const mostChosen = 5000;
const membersSchema = z.array(z.object({ id: idSchema, version: versionSchema })).min(1, 'names no member').max(mostChosen, `names more than ${mostChosen} members`);
const foundSchema = z.object({
  filter: memberNarrowingSchema,
  /** taken out of what is found */
  except: z.array(idSchema).max(500, 'leaves out more than 500 members').default([]),
  count: z.number().int().min(1),
  stamp: z.string().max(100),
});
export type MembersFound = z.infer<typeof foundSchema>;

export const memberChoiceShape = { members: membersSchema.optional(), found: foundSchema.optional() };
export interface MemberChoice { members?: z.infer<typeof membersSchema> | undefined; found?: MembersFound | undefined }
export const isOneChoice = ({ members, found }: MemberChoice): boolean => (members === undefined) !== (found === undefined);
export const notOneChoice = { error: 'choose members, or all that a filter finds', path: ['members'] };
export const memberChoiceSchema = z.object(memberChoiceShape).refine(isOneChoice, notOneChoice);

/** All that a filter finds, before anything is done with it: how many, under which stamp, and what may be accepted of them. */
export const foundRequestSchema = foundSchema.omit({ count: true, stamp: true });
export type FoundRequest = z.infer<typeof foundRequestSchema>;
