import { getContext, setContext } from 'svelte';
import type { Spec } from '../../domain/shelf-life/spec';
import type { TemperatureUnit } from '../../domain/units';
import { specIssues } from '../../messages/en/spec-faults';
import { readSpecForm } from '../../schemas/spec-form';
import {
	filledRows,
	leastRows,
	rowFields,
	type RowKind,
	type SpecFormValues
} from '../../schemas/spec-form-values';

export interface SpecEditorStart {
	values: SpecFormValues;
	/** What the server found, until something is typed. */
	issues: Record<string, string>;
	/** The saved figures the curve shows until the fields make sense. */
	saved: Spec | null;
	isEditable: boolean;
	unit: TemperatureUnit;
}

/** The fields of a spec while somebody looks at or edits it: read again at every key, so that curve and faults follow. */
export class SpecEditor {
	values: SpecFormValues;
	readonly isEditable: boolean;
	readonly unit: TemperatureUnit;
	private readonly first: SpecFormValues;
	private isTouched = $state(false);
	private lastGood: Spec | null;
	private readonly read;
	readonly issues: Record<string, string>;
	/** What the fields say now, or said last when they made sense. */
	readonly spec: Spec | null;

	constructor({ values, issues, saved, isEditable, unit }: SpecEditorStart) {
		const state = $state({ ...values });
		this.values = state;
		this.first = { ...values };
		this.isEditable = isEditable;
		this.unit = unit;
		this.lastGood = saved;
		this.read = $derived(readSpecForm(state));
		this.issues = $derived(this.isTouched ? specIssues(this.read.faults, state) : issues);
		this.spec = $derived.by(() => {
			// What was typed last and made sense stays drawn while a figure is half typed.
			if (this.read.spec) this.lastGood = this.read.spec;
			return this.lastGood;
		});
	}

	touch = (): void => {
		this.isTouched = true;
	};

	/** Whether anything differs from what was loaded. */
	get isChanged(): boolean {
		const names = Object.keys({ ...this.first, ...this.values });
		return names.some((name) => (this.values[name] ?? '') !== (this.first[name] ?? ''));
	}

	/** Rows to offer: the filled ones and an empty one, unless there is nothing to fill in. */
	rowCount(kind: RowKind): number {
		const filled = filledRows(this.values, kind);
		return this.isEditable ? Math.max(leastRows[kind], filled + 1) : filled;
	}

	/** Takes the published points over as the points of a storage-life table, but for the reference's own. */
	useLifeTable = (): void => {
		const points = this.publishedPoints();
		this.clearRows(/^point\d/);
		points.forEach(([degrees, life], at) => {
			this.values[`point${at}Degrees`] = degrees;
			this.values[`point${at}Life`] = life;
		});
		this.values.model = 'life-table';
		this.touch();
	};

	/** Takes a fitted model over: its own figures, the reference and the range it was fitted on. */
	take = (fitted: SpecFormValues): void => {
		this.clearRows(/^(point|band)\d/);
		Object.assign(this.values, fitted);
		this.touch();
	};

	/** Takes one row out; those below it move up. */
	removeRow = (kind: RowKind, at: number): void => {
		const filled = filledRows(this.values, kind);
		for (let row = at; row < filled; row++)
			for (const field of rowFields[kind])
				this.values[`${kind}${row}${field}`] = this.values[`${kind}${row + 1}${field}`] ?? '';
		this.touch();
	};

	/** Whether a row holds anything that could be taken out. */
	isFilled(kind: RowKind, at: number): boolean {
		return rowFields[kind].some((field) => (this.values[`${kind}${at}${field}`] ?? '').trim() !== '');
	}

	private clearRows(names: RegExp): void {
		for (const name of Object.keys(this.values)) if (names.test(name)) this.values[name] = '';
	}

	private publishedPoints(): [string, string][] {
		const points: [string, string][] = [];
		for (let at = 0; at < filledRows(this.values, 'source'); at++) {
			const degrees = this.values[`source${at}Degrees`] ?? '';
			const life = this.values[`source${at}Life`] ?? '';
			const isOwn =
				Number(degrees.replace('−', '-')) === Number((this.values.reference ?? '').replace('−', '-'));
			const isKnown = points.some(([known]) => known === degrees);
			if (degrees && life && !isOwn && !isKnown) points.push([degrees, life]);
		}
		return points;
	}
}

/** Under which the editor stands in the context of a form's parts. */
export const specEditorKey = Symbol('spec editor');

export function provideSpecEditor(editor: SpecEditor): SpecEditor {
	return setContext(specEditorKey, editor);
}

export function specEditor(): SpecEditor {
	return getContext<SpecEditor>(specEditorKey);
}
