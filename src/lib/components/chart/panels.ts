import uPlot from 'uplot';
import { drawAreas, drawBands, drawCaps, drawCosts } from './draw-excursions';
import { drawLifeBand, drawNeed, drawOpening } from './draw-life';
import { drawLimits } from './draw-limits';
import { drawCustody, drawGaps, drawTraceNames } from './draw-marks';
import { drawScale } from './draw-scale';
import { drawTimeAxis } from './draw-time-axis';
import { withPen, type Drawing, type Pen } from './drawing';
import { lifePaddingPx, lifeScale, temperatureScale } from './heights';

export interface Panels {
	/** Draws again at the view that the drawing now has. */
	show: () => void;
	destroy: () => void;
}

interface PanelParts {
	heightPx: number;
	padding: uPlot.Padding;
	range: [number, number];
	/** Under the lines, in this order. */
	under: (pen: Pen) => void;
	over: (pen: Pen) => void;
	series: uPlot.Series[];
}

/** The library keeps scales and draws lines of a million readings; everything else on the panels is ours. */
function optionsOf(drawing: Drawing, parts: PanelParts): uPlot.Options {
	return {
		width: drawing.layout.widthPx,
		height: parts.heightPx,
		padding: parts.padding,
		// Rounding to whole pixels would make stairs of a line that falls slowly.
		pxAlign: 0,
		legend: { show: false },
		cursor: { show: false },
		scales: {
			x: { time: false, range: (_chart, min, max) => [min, max] },
			y: { range: parts.range }
		},
		axes: [{ show: false }, { show: false }],
		series: [{}, ...parts.series],
		hooks: {
			drawClear: [(chart) => withPen(chart, parts.under)],
			draw: [(chart) => withPen(chart, parts.over)]
		}
	};
}

function temperaturePanel(drawing: Drawing): uPlot.Options {
	const { model, palette, layout } = drawing;
	const scale = temperatureScale(model);
	return optionsOf(drawing, {
		heightPx: layout.temperaturePx,
		padding: [layout.topPx, layout.rightPx, layout.axisPx, layout.leftPx],
		range: [scale.from, scale.to],
		under: (pen) => {
			drawBands(pen, drawing, true);
			drawScale(pen, drawing, scale.ticks);
			drawAreas(pen, drawing);
			drawCustody(pen, drawing);
			drawLimits(pen, drawing);
		},
		over: (pen) => {
			drawGaps(pen, drawing);
			drawTraceNames(pen, drawing);
			drawCaps(pen, drawing);
			drawTimeAxis(pen, drawing);
		},
		series: model.styles.map(({ dash, widthPx, isInk }) => ({
			stroke: isInk ? palette.ink : palette.edge,
			width: widthPx,
			dash: [...dash],
			points: { show: false }
		}))
	});
}

function lifePanel(drawing: Drawing): uPlot.Options {
	const { model, palette, layout } = drawing;
	const scale = lifeScale(model);
	const hidden = { show: false };
	return optionsOf(drawing, {
		heightPx: layout.lifePx,
		padding: [lifePaddingPx, layout.rightPx, lifePaddingPx, layout.leftPx],
		range: [scale.from, scale.to],
		under: (pen) => {
			drawBands(pen, drawing, false);
			drawScale(pen, drawing, scale.ticks);
			drawCustody(pen, drawing);
			drawLifeBand(pen, drawing);
			drawOpening(pen, drawing);
		},
		over: (pen) => {
			drawNeed(pen, drawing);
			drawCosts(pen, drawing);
		},
		series: [{ stroke: palette.ink, width: 1.7, points: hidden }, hidden, hidden]
	});
}

/** Both panels on one time axis; the drawing's view may change afterwards, all else needs new panels. */
export function createPanels(drawing: Drawing, temperatureHost: HTMLElement, lifeHost: HTMLElement): Panels {
	const charts = [new uPlot(temperaturePanel(drawing), drawing.model.traces, temperatureHost)];
	if (drawing.model.life) charts.push(new uPlot(lifePanel(drawing), drawing.model.life, lifeHost));
	function show() {
		for (const chart of charts) chart.setScale('x', { min: drawing.view.fromMs, max: drawing.view.toMs });
	}
	show();
	return { show, destroy: () => charts.forEach((chart) => chart.destroy()) };
}
