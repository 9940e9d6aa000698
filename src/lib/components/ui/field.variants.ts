export type FieldSize = 'desk' | 'dock';

/** Classes of anything one types into; an error has a 2 px hull edge and words below it. */
export function fieldClasses(size: FieldSize, hasError: boolean): string {
	return [
		'block w-full rounded-control bg-sheet px-3 text-ink border',
		size === 'dock' ? 'min-h-[52px] text-[17px] leading-[22px]' : 'min-h-[46px] text-[15px] leading-[22px]',
		'touch:min-h-[52px]',
		hasError ? 'border-hull ring-1 ring-inset ring-hull' : 'border-edge hover:border-ink'
	].join(' ');
}

/** Which of its two lines describes the field. */
export function describedBy(id: string, help: string | undefined, error: string | undefined) {
	if (error) return `${id}-error`;
	return help ? `${id}-help` : undefined;
}
