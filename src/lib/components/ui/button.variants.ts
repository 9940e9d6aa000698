/** One primary on a page, in the counterfoil. */
export type ButtonVariant = 'primary' | 'quiet' | 'destructive';
/** 46 px at the desk, 56 at the dock, 36 inside tables. */
export type ButtonSize = 'desk' | 'dock' | 'table';

const base =
	'inline-flex items-center justify-center gap-2 rounded-control border text-center font-semibold no-underline select-none';

const variants: Record<ButtonVariant, string> = {
	primary: 'border-buoy bg-buoy text-on-buoy hover:border-buoy-hover hover:bg-buoy-hover',
	quiet: 'border-edge bg-sheet text-ink hover:border-ink hover:bg-paper',
	destructive: 'border-hull bg-sheet text-hull hover:bg-hull-wash'
};

const sizes: Record<ButtonSize, string> = {
	desk: 'min-h-[46px] px-5 py-2 text-[15px] leading-5 touch:min-h-12',
	dock: 'min-h-14 px-6 py-2.5 text-[17px] leading-[22px]',
	table: 'min-h-9 px-3.5 py-1.5 text-[15px] leading-5 touch:min-h-12'
};

const notYet = 'border-dashed border-edge bg-transparent text-ink2 cursor-default';

/** Classes of a button, or of a link that looks like one. */
export function buttonClasses(
	variant: ButtonVariant,
	size: ButtonSize,
	state: { isWide: boolean; isPossible: boolean }
): string {
	const look = state.isPossible ? variants[variant] : notYet;
	return [base, sizes[size], look, state.isWide ? 'w-full' : ''].join(' ');
}
