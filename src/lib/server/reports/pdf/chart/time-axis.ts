import type { DateTime } from 'luxon';
import type { Draft } from '../draft';
import { palette, sizePoints } from '../palette';
import type { Frame } from './frame';
import { element, textElement, type Node } from './svg';
import { apart, widthOf } from './words-room';

const hourSteps = [1, 2, 3, 6, 12] as const;
const labelRoomPoints = 17;
const msPerHour = 3_600_000;

/** Ticks at whole local hours, longer at midnight, the days named below; by days where hours have no room. */
export function timeAxis(draft: Draft, frame: Frame): Node[] {
	const hours = (frame.toMs - frame.fromMs) / msPerHour;
	const roomForHours = (frame.right - frame.left) / labelRoomPoints;
	const step = hourSteps.find((candidate) => hours / candidate <= roomForHours) ?? 24;
	const bottom = frame.temperatureBottom;
	const zone = draft.calendar.zoneName(frame.toMs);
	const zoneText = zone.includes('/') ? `UTC${draft.calendar.offset(frame.toMs)}` : zone;
	return [
		element('path', {
			d: `M${frame.left} ${bottom}H${frame.right}`,
			stroke: palette.ink,
			'stroke-width': 0.8,
			fill: 'none'
		}),
		...(step < 24 ? hourTicks(draft, frame, step) : []),
		...dayNames(draft, frame),
		textElement(frame.right + 6, bottom + 12, zoneText, {
			family: 'Semi',
			size: sizePoints.chartWord,
			color: palette.ink2
		})
	];
}

/** Local midnights of the journey; days of 23 or 25 hours keep their place. */
function midnights(draft: Draft, frame: Frame): DateTime[] {
	const days: DateTime[] = [];
	for (
		let day = draft.calendar.at(frame.fromMs).startOf('day');
		day.toMillis() <= frame.toMs;
		day = day.plus({ days: 1 })
	)
		days.push(day);
	return days;
}

function hourTicks(draft: Draft, frame: Frame, step: number): Node[] {
	const nodes: Node[] = [];
	for (const day of midnights(draft, frame)) {
		for (let hour = 0; hour < 24; hour += step) {
			const moment = day.set({ hour });
			const ms = moment.toMillis();
			if (ms < frame.fromMs || ms > frame.toMs || moment.hour !== hour) continue;
			const color = hour === 0 ? palette.ink : palette.ink2;
			const text = moment.toFormat('HH');
			nodes.push(tick(frame, ms, hour === 0 ? 5 : 3));
			nodes.push(
				textElement(frame.x(ms), frame.temperatureBottom + 12, text, {
					family: 'Mono',
					size: sizePoints.chartFigure,
					color,
					anchor: 'middle'
				})
			);
		}
	}
	return nodes;
}

function tick(frame: Frame, ms: number, length: number): Node {
	return element('path', {
		d: `M${frame.x(ms)} ${frame.temperatureBottom}v${length}`,
		stroke: palette.edge,
		'stroke-width': 0.7,
		fill: 'none'
	});
}

function dayNames(draft: Draft, frame: Frame): Node[] {
	const inside = midnights(draft, frame).filter((day) => day.toMillis() >= frame.fromMs);
	const days = inside.length === 0 ? [draft.calendar.at(frame.fromMs)] : inside;
	const room = (frame.right - frame.left) / Math.max(days.length, 1);
	const names = days.map((day) => {
		const item = day.toFormat(room > 44 ? 'ccc d LLL' : 'd LLL');
		const half = widthOf(item, 'Semi', sizePoints.chartWord) / 2;
		return { item, at: Math.min(Math.max(frame.x(day.toMillis()), frame.left + half), frame.right - half) };
	});
	const placed = apart(names, (name) => widthOf(name, 'Semi', sizePoints.chartWord), 5);
	return [
		...inside.map((day) => tick(frame, day.toMillis(), 5)),
		...placed.map(({ item, at }) =>
			textElement(at, frame.temperatureBottom + 22.5, item, {
				family: 'Semi',
				size: sizePoints.chartWord,
				bold: true,
				color: palette.ink,
				anchor: 'middle'
			})
		)
	];
}
