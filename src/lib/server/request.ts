import { error, fail, type ActionFailure } from '@sveltejs/kit';
import type { z } from 'zod';
import type { Context } from './context';
import { Refusal } from './refusals';
import { InvalidFields } from './shipments/invalid-fields';

/** Who is asking. Every action and API handler begins with it. @throws 401 without a session */
export function contextOf(locals: App.Locals): Context {
	if (!locals.context) error(401, { message: 'Sign in first.', code: 'no-session' });
	return locals.context;
}

/** What went wrong with one field, for the form that shows it. */
export type Issues = Record<string, string>;

export type Parsed<Data> =
	{ ok: true; data: Data } | { ok: false; values: Record<string, unknown>; issues: Issues };

/** Fields named `lines.0.lot` become `{ lines: [{ lot }] }`; repeated names become lists. Files stay files. */
export function nestedOf(form: FormData): Record<string, unknown> {
	const root: Record<string, unknown> = {};
	for (const name of new Set(form.keys())) {
		if (/(^|\.)(__proto__|constructor|prototype)(\.|$)/.test(name)) continue;
		const values = form.getAll(name);
		const isList = name.endsWith('[]') || values.length > 1;
		place(root, name.replace(/\[\]$/, '').split('.'), isList ? values : values[0]);
	}
	return root;
}

function place(root: Record<string, unknown>, path: string[], value: unknown): void {
	let at: Record<string, unknown> | unknown[] = root;
	path.forEach((key, depth) => {
		const isLast = depth === path.length - 1;
		const next = path[depth + 1];
		const holder = at as Record<string, unknown>;
		if (isLast) holder[key] = value;
		else {
			holder[key] ??= next !== undefined && /^\d{1,3}$/.test(next) ? [] : {};
			at = holder[key] as Record<string, unknown> | unknown[];
		}
	});
}

/** Field path → first sentence about it. */
export function issuesOf(fault: z.ZodError): Issues {
	const issues: Issues = {};
	for (const issue of fault.issues) issues[issue.path.join('.') || 'form'] ??= issue.message;
	return issues;
}

/** Parses a form by its schema; bad input comes back with the user's values. */
export async function parseForm<Schema extends z.ZodType>(
	request: Request,
	schema: Schema
): Promise<Parsed<z.output<Schema>>> {
	const values = nestedOf(await request.formData());
	const parsed = schema.safeParse(values);
	if (parsed.success) return { ok: true, data: parsed.data };
	return { ok: false, values: withoutSecrets(values), issues: issuesOf(parsed.error) };
}

function withoutSecrets(values: Record<string, unknown>): Record<string, unknown> {
	return Object.fromEntries(
		Object.entries(values).filter(([name, value]) => !/password/i.test(name) && !(value instanceof File))
	);
}

/** Translates a refusal for a page. Anything else stays a bug. */
export async function orError<Result>(work: Promise<Result>): Promise<Result> {
	try {
		return await work;
	} catch (e) {
		if (e instanceof Refusal) error(e.status, { message: e.message, code: e.code });
		throw e;
	}
}

/** Translates a refusal for a form, which keeps what the user typed. */
export function orFail(
	e: unknown,
	values: Record<string, unknown> = {}
): ActionFailure<{ values: Record<string, unknown>; issues: Issues; code: string }> {
	if (e instanceof Refusal)
		return fail(e.status, { values: withoutSecrets(values), issues: { form: e.message }, code: e.code });
	throw e;
}

/** Answers an API call: the result as JSON, a refusal as `{ code, message }`. */
export async function asJson(work: () => Promise<unknown>): Promise<Response> {
	try {
		return Response.json(await work());
	} catch (e) {
		return refusalAsJson(e);
	}
}

export function refusalAsJson(e: unknown): Response {
	if (e instanceof InvalidFields) {
		// Some faults are questions to the one who types; to a program they are a statement.
		const message = e.message.replace(/[.?!]?$/, '.');
		return Response.json({ code: e.code, message, issues: e.issues }, { status: e.status });
	}
	if (e instanceof Refusal) return Response.json({ code: e.code, message: e.message }, { status: e.status });
	throw e;
}

/** Parses query or JSON input of an API call. @throws Refusal `invalid` naming field and fault */
export function parseInput<Schema extends z.ZodType>(input: unknown, schema: Schema): z.output<Schema> {
	const parsed = schema.safeParse(input);
	if (parsed.success) return parsed.data;
	throw new InvalidFields(issuesOf(parsed.error));
}
