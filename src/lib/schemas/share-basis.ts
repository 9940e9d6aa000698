import { z } from 'zod';
import { shareBases } from '../domain/custody/shares';

/** What the shares of a docket's legs are shares of, as its address says. */
export const shareBasisQuery = z.object({ basis: z.enum(shareBases).catch('over-use').default('over-use') });
