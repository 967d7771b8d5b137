import { z } from 'zod';
import { idSchema } from './primitives.js';

/** What of a project a change touched; whoever shows it asks for it again. */
export const liveTopics = ['project', 'levels', 'zones', 'sections', 'members', 'products', 'imports', 'revisions', 'team', 'results', 'jobs'] as const;
export type LiveTopic = (typeof liveTopics)[number];

/** ids told with a change; of more than these, none is told */
export const LIVE_IDS = 20;

/** A change that was committed, as the stream of a project tells it. */
export const projectEventSchema = z.object({
  topics: z.array(z.enum(liveTopics)).min(1),
  /** the things concerned, where they are few */
  entityIds: z.array(idSchema).max(LIVE_IDS),
  by: z.object({ id: idSchema, name: z.string() }).nullable(),
  at: z.iso.datetime(),
  /** "Tamsin Emberley changed zone Z03 Hall"; null where nobody needs to be told */
  text: z.string().nullable(),
});
export type ProjectEventDto = z.infer<typeof projectEventSchema>;

/** The first thing a stream says. `missed`: something changed while it was being opened, so what was read before may be old. */
export const streamReadySchema = z.object({ missed: z.boolean() });
export type StreamReadyDto = z.infer<typeof streamReadySchema>;
