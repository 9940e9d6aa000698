/** What the mails say that carry a link to sign in with. */
interface LinkMailWords {
	subject: string;
	title: string;
	paragraphs: string[];
	button: string;
	after: string;
}

export type LinkMailKind = 'invitation' | 'welcome' | 'sign-in' | 'notice';

export interface LinkMailFacts {
	organisation: string;
	/** Who sent the invitation. */
	by: string;
	/** The docket a notice speaks of. */
	docket: string;
	until: string;
}

const words: Record<LinkMailKind, (facts: LinkMailFacts) => LinkMailWords> = {
	invitation: ({ organisation, by, until }) => ({
		subject: `Your account at ${organisation}`,
		title: 'Set your password',
		paragraphs: [
			`${by} has made an account for you in Wharfinger, where ${organisation} receives its loads.`,
			'Open the page below, check your name and choose a password.'
		],
		button: 'Set a password',
		after: `The link works once, until ${until}.`
	}),
	welcome: ({ organisation, by, until }) => ({
		subject: `See your loads at ${organisation}`,
		title: 'See your loads',
		paragraphs: [
			`${by} of ${organisation} has given you access to the loads of your firm: readings, verdicts and reports.`,
			'You need no password. Whenever you come back, have a link mailed from the sign-in page.'
		],
		button: 'See your loads',
		after: `The link works once, until ${until}.`
	}),
	'sign-in': ({ organisation, until }) => ({
		subject: `Your link to ${organisation}`,
		title: 'Your link to sign in',
		paragraphs: [`Somebody, most likely you, asked for a link to see your loads at ${organisation}.`],
		button: 'Sign in',
		after: `The link works once, until ${until}. If you did not ask for it, nothing needs doing.`
	}),
	notice: ({ docket, organisation, until }) => ({
		subject: `A fresh link to docket ${docket}`,
		title: `A fresh link to docket ${docket}`,
		paragraphs: [
			`You or somebody with your earlier link asked ${organisation} for a new one. It opens this docket only.`
		],
		button: 'See the docket',
		after: `The link works once, until ${until}, and is yours alone: whoever uses it answers in your name.`
	})
};

export function linkMailWords(kind: LinkMailKind, facts: LinkMailFacts): LinkMailWords {
	return words[kind](facts);
}

export const linkMailLabels = {
	greeting: (name: string) => `Dear ${name},`,
	signsIn: 'You sign in as',
	firm: 'You see the loads of',
	docket: 'Docket',
	works: 'Works until',
	foot: (organisation: string) =>
		`Sent by ${organisation} through Wharfinger. Never pass a link on: it stands for you.`
} as const;
