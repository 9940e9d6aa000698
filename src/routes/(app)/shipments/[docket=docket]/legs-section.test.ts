import { flushSync, mount, unmount } from 'svelte';
import { afterEach, describe, expect, it } from 'vitest';
import {
	buildHandover,
	buildInput,
	buildSpec,
	buildTrace,
	hourMs,
	startMs
} from '../../../../../tests/accuracy/build';
import { assess } from '$lib/domain/receiving/assess';
import type { AssessmentView } from '$lib/schemas/docket';
import LegsSection from './LegsSection.svelte';

/** Hours of each leg as planned, as taken, and the temperature held; each is allowed its plan at 0 °C. */
function assessed(
	legs: readonly (readonly [planned: number, took: number, celsius: number])[],
	neededHours: number
): AssessmentView {
	let planned = startMs;
	let actual = startMs;
	const handovers = [buildHandover('1', startMs, { plannedMs: startMs, holder: 'Grower' })];
	const celsius = [legs[0]?.[2] ?? 0];
	legs.forEach(([plannedHours, tookHours, held], i) => {
		planned += plannedHours * hourMs;
		actual += tookHours * hourMs;
		handovers.push(buildHandover(String(i + 2), actual, { plannedMs: planned, holder: `Carrier ${i + 2}` }));
		for (let hour = 0; hour < tookHours; hour++) celsius.push(held);
	});
	const {
		legs: uses,
		windowToMs,
		...figures
	} = assess(
		buildInput(buildTrace(celsius, 60), buildSpec({ fullLifeHours: 336 }), { handovers, neededHours })
	);
	const iso = (ms: number) => new Date(ms).toISOString();
	return {
		...figures,
		id: 'a',
		lineId: 'l',
		traceId: 't',
		logger: 'A-1',
		isGoverning: true,
		specId: 's',
		specName: 'Berries',
		specVersion: 1,
		windowFromAt: iso(figures.windowFromMs),
		windowToAt: iso(windowToMs),
		openingBasis: '',
		openingKind: 'declared',
		accuracyCelsius: 0,
		upperCelsius: null,
		lowerCelsius: null,
		freezingCelsius: null,
		ceilingCelsius: null,
		gaps: [],
		unobservedUsedHours: 0,
		trimmedHours: 0,
		worstWindowMktCelsius: null,
		rangeParts: [...figures.rangeParts],
		limitTimes: [...figures.limitTimes],
		incidents: [...figures.incidents],
		excursions: [...figures.excursions],
		stops: [...figures.stops],
		legs: [...uses]
	};
}

type Props = Parameters<typeof LegsSection>[1];
let shown: Record<string, unknown> | undefined;

afterEach(async () => {
	if (shown) await unmount(shown);
	document.body.replaceChildren();
});

function show(assessment: AssessmentView, props: Partial<Props> = {}): void {
	const given = { assessment, zone: 'UTC', unit: 'celsius', referenceCelsius: 0 } as const;
	shown = mount(LegsSection, { target: document.body, props: { ...given, ...props } });
	flushSync();
}

const text = () => document.body.textContent?.replace(/\s+/g, ' ') ?? '';
const numbersOf = (row: Element | undefined) =>
	[...(row?.querySelectorAll('td.num') ?? [])].map((cell) => cell.textContent?.trim());
const bodyRows = () => [...document.querySelectorAll('tbody tr')];

describe('the legs of a docket', () => {
	it('split over-use into too warm and too late, row by row, and add up below', () => {
		// Q10 of 3 by its definition: leg A took its 10 h at 0 °C, leg B 30 h of 20 planned at 10 °C, three times as fast;
		// the last hour before the handover runs from one temperature to the other: that hour uses (3 − 1)/ln 3.
		const assessment = assessed(
			[
				[10, 10, 0],
				[20, 30, 10]
			],
			100
		);
		show(assessment);
		const [first, second] = assessment.legs;
		expect(first?.overHours).toBeCloseTo(0, 9);
		expect(second?.tooLateHours).toBeCloseTo(10, 6);
		expect(second?.usedHours).toBeCloseTo(29 * 3 + 2 / Math.log(3), 6);
		expect(second?.tooWarmHours).toBeCloseTo(29 * 3 + 2 / Math.log(3) - 30, 6);
		expect(bodyRows()).toHaveLength(2);
		// Planned, took, allowed, used, over, too warm, too late, share.
		expect(numbersOf(bodyRows()[1]).slice(1)).toEqual([
			'20:00',
			'30:00',
			'20.0',
			'88.8',
			'68.8',
			'58.8',
			'10.0',
			'100'
		]);
		const foot = numbersOf(document.querySelector('tfoot tr') ?? undefined);
		expect(foot.at(-1)).toBe('100');
		expect(foot[2]).toBe('30.0');
	});

	it('say what would be left without a leg’s over-use, and whether that passes', () => {
		// 336 − 98.8 = 237.2 h, 9.9 d; without the 68.8 h of leg B 306 h, 12.75 d.
		show(
			assessed(
				[
					[10, 10, 0],
					[20, 30, 10]
				],
				300
			)
		);
		expect(text()).toMatch(/without leg B’s over-use 12\.8 d \(12\.8\), passes/);
		expect(text()).not.toContain('without leg A');
	});

	it('say that it would still be short where it would', () => {
		show(
			assessed(
				[
					[10, 10, 0],
					[20, 30, 10]
				],
				320
			)
		);
		expect(text()).toContain(', still short');
	});

	it('give no verdict beside a load that passes anyway', () => {
		show(
			assessed(
				[
					[10, 10, 0],
					[20, 30, 10]
				],
				100
			)
		);
		expect(text()).toMatch(/without leg B’s over-use 12\.[78] d/);
		expect(text()).not.toContain('passes');
	});

	it('name the basis of the shares and lead to the other one', () => {
		show(
			assessed(
				[
					[10, 10, 0],
					[20, 30, 10]
				],
				100
			),
			{ basis: 'used' }
		);
		expect(text()).toContain('Shares are of the life used');
		expect(document.querySelector('a[href="?basis=over-use#legs"]')).not.toBeNull();
		const shares = bodyRows().map((row) => Number(numbersOf(row).at(-1)));
		expect(shares.reduce((sum, share) => sum + share, 0)).toBe(100);
	});

	it('ask for handovers where none are known', () => {
		show({ ...assessed([[10, 10, 0]], 100), legs: [] });
		expect(text()).toContain('No handover times are known');
		expect(document.querySelector('table')).toBeNull();
	});
});
