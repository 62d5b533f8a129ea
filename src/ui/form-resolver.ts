import { zodResolver } from '@hookform/resolvers/zod';
import type { z } from 'zod';
import { plainIssue } from './plain-issue';

type FormSchema = z.ZodType<Record<string, unknown>, Record<string, unknown>>;

/** Checks a form by the contract's own object, with issues in plain words. */
export const formResolver = <S extends FormSchema>(schema: S) =>
  zodResolver<z.input<S>, unknown, z.output<S>>(schema as never, { error: plainIssue });
