import { z } from 'zod';

/** What the library of starting specs is searched for. */
export const libraryQuery = z.object({ q: z.string().trim().max(80).catch('').default('') });

/** Where a starting spec goes: a product, one of its varieties after a colon, or a new product. */
export const copyForm = z.object({
	place: z
		.union([z.literal('new'), z.string().regex(/^[0-9a-f-]{36}(:[0-9a-f-]{36})?$/)], 'Choose a product.')
		.transform((place) => {
			const [productId, varietyId] = place.split(':');
			return place === 'new' ? null : { productId: productId ?? '', varietyId: varietyId ?? null };
		})
});

/** Which starting spec an address is drawn from. */
export const startingQuery = z.object({
	from: z.string().trim().max(80).nullable().catch(null).default(null)
});
