/** The mail that tells an admin in good time. */
export function certificateMailWords(organisation: string, until: string) {
	return {
		subject: `The certificate that seals reports ends on ${until}`,
		greeting: (name: string) => `Dear ${name},`,
		paragraphs: [
			`The certificate that ${organisation} seals its receiving reports with ends on ${until}.`,
			'Order the next one and upload it in the settings. Reports sealed until then stay as they are and can still be checked.'
		],
		labels: { subject: 'Certificate', serial: 'Serial number', until: 'Valid until' },
		button: 'Open certificate',
		foot: 'You get this once, as an admin.'
	} as const;
}
