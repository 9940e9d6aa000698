import type { Role } from '../../context';

/** A person who signs in; invented, like everybody here. */
export interface DemoPerson {
	key: string;
	name: string;
	title: string;
	email: string;
	roles: Role[];
	/** Firm whose loads a supplier's user sees. */
	partner?: string;
	/** Invited, and has not chosen a password yet. */
	isInvited?: boolean;
	/** May write the determination without which goods over a stop are not taken. */
	isQualifiedPerson?: boolean;
}

const staff = (key: string, name: string, title: string): DemoPerson => ({
	key,
	name,
	title,
	email: `${key}@wharfinger.example`,
	roles: [key as Role]
});

/** The password of all who have one. */
export const demoPassword = 'wharfinger-demo';

export const admin = staff('admin', 'Hanneke Pryce', 'Quality manager');

export const people: readonly DemoPerson[] = [
	staff('dock', 'D. Marsh', 'dock'),
	staff('qa', 'Ruth Calloway', 'QA'),
	/** The second person, where a decision needs two. */
	{ ...staff('qa2', 'Jonas Adeyemi', 'QA, qualified person'), roles: ['qa'], isQualifiedPerson: true },
	staff('claims', 'Ivo Sander', 'claims'),
	{
		key: 'dock2',
		name: 'Tam Orrell',
		title: 'dock, nights',
		email: 'tam.orrell@wharfinger.example',
		roles: ['dock'],
		isInvited: true
	},
	{
		key: 'supplier',
		name: 'Lucía Ferrán',
		title: 'quality',
		email: 'lucia.ferran@olmarisa-berry-growers.example',
		roles: ['supplier'],
		partner: 'olmarisa'
	}
];
