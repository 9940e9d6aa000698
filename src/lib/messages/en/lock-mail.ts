interface LockFacts {
	organisation: string;
	admin: string;
	name: string;
	email: string;
	at: string;
}

/** What an admin is told when somebody's account locks itself after wrong passwords at signing. */
export function lockMailWords({ organisation, admin, name, email, at }: LockFacts) {
	return {
		subject: `Account locked: ${name}`,
		content: {
			kicker: organisation,
			title: `The account of ${name} is locked`,
			greeting: `Dear ${admin},`,
			paragraphs: [
				'Five wrong passwords or codes were entered where a signature is made. Nothing was signed with them.',
				'Ask the person whether it was they. If not, let them set a new password before you unlock the account.'
			],
			facts: [
				{ label: 'Account', value: `${name}, ${email}` },
				{ label: 'Locked', value: at }
			],
			button: { word: 'Open the account' },
			after: ['Who tried, when and from where stands in the record.'],
			foot: `Sent by ${organisation} through Wharfinger to everyone who manages accounts.`
		}
	};
}
