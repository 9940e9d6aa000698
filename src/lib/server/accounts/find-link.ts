import { Contact } from '../db/models/contact';
import { Shipment } from '../db/models/shipment';
import { User } from '../db/models/user';
import { findToken } from './tokens';

/** What a mailed link is good for, as its page says before and after its use. */
export interface LinkView {
	state: 'open' | 'spent';
	kind: 'sign-in' | 'notice';
	/** Enough for its owner to know it, not enough for a stranger to use it. */
	maskedEmail: string;
	docket: string | null;
	shipmentId: string | null;
}

/** `quality@olmarisa.example` as `q…y@olmarisa.example`. */
export function maskedEmail(email: string): string {
	const [name = '', domain = ''] = email.split('@');
	const last = name.length > 2 ? name.at(-1) : '';
	return `${name.slice(0, 1)}…${last}@${domain}`;
}

/** The link of that secret; null where there never was one or its owner has been switched off. */
export async function findLink(secret: string, now: Date): Promise<LinkView | null> {
	const token = await findToken(secret);
	if (!token || token.kind === 'invitation') return null;
	const owner = token.userId
		? await User.findByPk(token.userId)
		: token.contactId && (await Contact.findByPk(token.contactId));
	if (!owner || owner.switchedOffAt) return null;
	const shipment = token.shipmentId ? await Shipment.findByPk(token.shipmentId) : null;
	return {
		state: token.usedAt || token.expiresAt <= now ? 'spent' : 'open',
		kind: token.kind,
		maskedEmail: maskedEmail(owner.email),
		docket: shipment?.number ?? null,
		shipmentId: shipment?.id ?? null
	};
}
