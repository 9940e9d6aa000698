import { systemContext } from '../context';
import { log } from '../log';
import { warnOfEnd } from './warn-of-end';

const everyMs = 6 * 3_600_000;

/** Looks at the certificate's end at once and every few hours; a database that is away is asked again later. */
export function watchCertificate(): { stop: () => void } {
	const look = () =>
		void warnOfEnd(systemContext(new Date(), 'certificate-watch')).catch((error: unknown) =>
			log().warn({ err: error }, 'the certificate’s end was not looked at')
		);
	look();
	const timer = setInterval(look, everyMs);
	timer.unref();
	return { stop: () => clearInterval(timer) };
}
