import * as z from 'zod';
import type { ReadingResult } from '#shared/reading/types.ts';

/** The engine's whole answer, as shared/reading describes it field by field. */
export const readingResult = z
  .custom<ReadingResult>((value) => typeof value === 'object' && value !== null)
  .meta({
    id: 'ReadingResult',
    description: 'The engine’s result; angles in degrees, times in milliseconds.',
  });
