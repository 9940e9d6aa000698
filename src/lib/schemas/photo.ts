import { z } from 'zod';
import { optionalId, optionalText } from './shipment-parts';

export const photoKinds = ['load', 'seal', 'set-point', 'papers', 'damage', 'pulp', 'other'] as const;
export type PhotoKind = (typeof photoKinds)[number];

/** Larger pictures are refused; the page makes them smaller before it sends them. */
export const maxPhotoBytes = 10_000_000;

export const photoInput = z.object({
	id: optionalId,
	kind: z.enum(photoKinds, { error: 'What does it show?' }).default('load'),
	caption: optionalText(200)
});
export type PhotoInput = z.output<typeof photoInput>;
