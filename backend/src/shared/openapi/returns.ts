import { SetMetadata } from '@nestjs/common';
import type { z } from 'zod';

/** What a route is for, in a sentence, and what it answers. */
export interface Returned {
  summary: string;
  /** of a JSON answer */
  schema: z.ZodType | null;
  /** of any other answer; null together with the schema where there is none */
  contentType: string | null;
}
export const RETURNED = 'mantlet:returned';

type Answering<T> = (...given: never[]) => T | Promise<T>;
type Method<T> = <M extends Answering<T>>(target: object, name: string | symbol, method: TypedPropertyDescriptor<M>) => void;
const returned = (value: Returned): MethodDecorator => SetMetadata(RETURNED, value);

/** JSON that fits the schema. A method that gives anything else does not compile. */
export const Returns = <S extends z.ZodType>(schema: S, summary: string): Method<z.output<S>> =>
  returned({ summary, schema, contentType: null }) as Method<z.output<S>>;

/** A file, or a stream of events. */
export const ReturnsFile = (contentType: string, summary: string): MethodDecorator => returned({ summary, schema: null, contentType });

export const ReturnsNothing = (summary: string): Method<void> => returned({ summary, schema: null, contentType: null }) as Method<void>;
