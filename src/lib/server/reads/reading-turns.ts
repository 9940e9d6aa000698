/** What may run at once: so many readings of any size, of which so many may be heavy. */
export interface TurnLimits {
	mostAtOnce: number;
	mostHeavy: number;
}

interface Waiting {
	isHeavy: boolean;
	start: () => void;
}

/**
 * Lets readings run in the order in which they came, except that a light one need not wait behind a heavy one: two
 * files of 50 MB at once would hold the memory of both, and a dock's small export would wait for them.
 */
export function turnsOf({ mostAtOnce, mostHeavy }: TurnLimits) {
	const waiting: Waiting[] = [];
	let running = 0;
	let heavy = 0;
	const fits = (isHeavy: boolean) => running < mostAtOnce && (!isHeavy || heavy < mostHeavy);
	const take = (isHeavy: boolean) => {
		running++;
		if (isHeavy) heavy++;
	};
	const leave = (isHeavy: boolean) => {
		running--;
		if (isHeavy) heavy--;
		for (;;) {
			const at = waiting.findIndex((next) => fits(next.isHeavy));
			if (at < 0) return;
			const [next] = waiting.splice(at, 1);
			if (!next) return;
			take(next.isHeavy);
			next.start();
		}
	};
	return async function inTurn<Result>(isHeavy: boolean, work: () => Promise<Result>): Promise<Result> {
		if (fits(isHeavy)) take(isHeavy);
		else await new Promise<void>((resolve) => waiting.push({ isHeavy, start: resolve }));
		try {
			return await work();
		} finally {
			leave(isHeavy);
		}
	};
}
