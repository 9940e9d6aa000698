import { goods, leg, type Lane } from './lane';

const berries = { rejectWithinHours: 8, placement: 'in-product' } as const;

/** The lanes into Pell Staithe. */
const staithe = {
	olmarisa: {
		...berries,
		...{ site: 'PS', supplier: 'olmarisa', carrier: 'anselm', mode: 'road', layout: 'iso', dock: 0 },
		legs: [
			leg('olmarisa', 'cold room', 12.5, 0.5, 'Olmarisa packhouse'),
			leg('trascoll', 'road', 8.5, 0.5),
			leg('merrow', 'sea, reefer container', 46, 0.5),
			leg('sarn', 'cross-dock and store', 11, 1),
			leg('anselm', 'road', 13.5, 0.5)
		],
		goods: [
			goods(['Blueberries', 'Blueberries, 12 × 125 g'], [960, 192], 14.4, 20),
			goods(['Blueberries', 'Blueberries, 8 × 250 g'], [1120, 160], 16.2, 20)
		]
	},
	tessil: {
		...berries,
		...{ site: 'PS', supplier: 'tessil', carrier: 'lanyard', mode: 'road', layout: 'german', dock: 0 },
		legs: [
			leg('tessil', 'pack line', 5, 0.5, 'Tessil Hill packhouse'),
			leg('lanyard', 'road and ferry', 19, 0.5)
		],
		goods: [goods(['Strawberries', 'Strawberries, 10 × 400 g'], [320, 80], 18.5, 8)]
	},
	lettuce: {
		...{ site: 'PS', supplier: 'lowfen', carrier: 'wade', mode: 'road', layout: 'with-humidity', dock: 0 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [
			leg('lowfen', 'vacuum cooler and store', 7, 1.5, 'Lowfen pack shed'),
			leg('wade', 'road and tunnel', 9, 1.5)
		],
		goods: [goods(['Lettuce, crisphead', 'Crisphead lettuce, 12 heads'], [420, 42], 9.6, 10)]
	},
	broccoli: {
		...{ site: 'PS', supplier: 'lowfen', carrier: 'wade', mode: 'road', layout: 'tabs', dock: 0 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('lowfen', 'store', 6, 1, 'Lowfen pack shed'), leg('wade', 'road and tunnel', 9, 1)],
		goods: [goods(['Broccoli, crowns', 'Broccoli crowns, 8 kg on ice'], [280, 40], 13.2, 14)]
	},
	cod: {
		...{ site: 'PS', supplier: 'brinnoch', carrier: 'bexcombe', mode: 'road', layout: 'json-list', dock: 1 },
		...{ rejectWithinHours: 6, placement: 'between-cases' },
		legs: [
			leg('brinnoch', 'hall, on ice', 4, 0.2, 'Brinnoch Fish Hall'),
			leg('bexcombe', 'road and ferry', 17, 0.2)
		],
		goods: [goods(['Cod, fresh, gutted', 'Cod, gutted, on ice, 20 kg'], [140, 20], 118, 36)]
	},
	salmon: {
		...{ site: 'PS', supplier: 'brinnoch', carrier: 'bexcombe', mode: 'road', layout: 'json-list', dock: 1 },
		...{ rejectWithinHours: 6, placement: 'between-cases' },
		legs: [
			leg('brinnoch', 'hall, on ice', 4, 0.3, 'Brinnoch Fish Hall'),
			leg('bexcombe', 'road and ferry', 18, 0.3)
		],
		goods: [goods(['Salmon, fresh, head on', 'Salmon, head on, 3/4 kg, on ice'], [96, 24], 142, 30)]
	},
	smoked: {
		...{ site: 'PS', supplier: 'skerrin', carrier: 'hollin', mode: 'road', layout: 'json-nested', dock: 1 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('skerrin', 'chill store', 6, 1, 'Skerrin Smokehouse'), leg('hollin', 'road and ferry', 20, 1)],
		goods: [goods(['Salmon, cold-smoked, vacuum', 'Smoked salmon, 20 × 200 g'], [160, 40], 96, 60)]
	},
	tulips: {
		...{
			site: 'PS',
			supplier: 'noorderkwel',
			carrier: 'hollin',
			mode: 'road',
			layout: 'with-humidity',
			dock: 0
		},
		...{ rejectWithinHours: 6, placement: 'air' },
		legs: [leg('noorderkwel', 'cool cell', 5, 2.5, 'Noorderkwel Bulbs'), leg('hollin', 'road', 3, 2.5)],
		goods: [goods(['Tulips, cut', 'Tulips, 50 stems a bucket'], [96, 24], 21.5, 10)]
	},
	asparagus: {
		...{ site: 'PS', supplier: 'heidsand', carrier: 'bexcombe', mode: 'road', layout: 'german', dock: 0 },
		...{ rejectWithinHours: 8, placement: 'in-product' },
		legs: [leg('heidsand', 'hydro-cooler', 4, 2.5, 'Heidsand pack house'), leg('bexcombe', 'road', 9, 2.5)],
		goods: [goods(['Asparagus', 'White asparagus, 5 kg'], [310, 62], 27.8, 12)]
	},
	tomatoes: {
		...{ site: 'PS', supplier: 'vesterglas', carrier: 'lanyard', mode: 'road', layout: 'tabs', dock: 0 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('vesterglas', 'grading', 6, 12, 'Vesterglas pack house'), leg('lanyard', 'road', 14, 12)],
		goods: [goods(['Tomatoes, ripe', 'Vine tomatoes, 5 kg'], [840, 84], 8.9, 16)]
	},
	grapes: {
		...{ site: 'PS', supplier: 'rocanegra', carrier: 'anselm', mode: 'road', layout: 'iso', dock: 0 },
		...{ rejectWithinHours: 24, placement: 'between-cases' },
		legs: [leg('rocanegra', 'cold room', 10, 0.5, 'Rocanegra packhouse'), leg('anselm', 'road', 34, 0.5)],
		goods: [goods(['Table grapes', 'Table grapes, white, 9 kg'], [1400, 140], 16.4, 18)]
	},
	milk: {
		...{ site: 'PS', supplier: 'meadowcote', carrier: 'wade', mode: 'road', layout: 'json-nested', dock: 0 },
		...{ rejectWithinHours: 6, placement: 'air' },
		legs: [leg('meadowcote', 'chill store', 5, 3, 'Meadowcote Dairy'), leg('wade', 'road and tunnel', 9, 3)],
		goods: [goods(['Milk, pasteurised', 'Whole milk, 12 × 1 l'], [220, 44], 11.8, 20)]
	},
	peas: {
		...{ site: 'PS', supplier: 'fennward', carrier: 'trascoll', mode: 'road', layout: 'iso', dock: 1 },
		...{ rejectWithinHours: 24, placement: 'air' },
		legs: [leg('fennward', 'cold store', 4, -21, 'Fennward store 6'), leg('trascoll', 'road', 8, -21)],
		goods: [goods(['Peas, frozen', 'Garden peas, 10 × 1 kg'], [600, 60], 15.1, 900)]
	},
	vaccine: {
		...{ site: 'PS', supplier: 'ostrel', carrier: 'hollin', mode: 'road', layout: 'json-list', dock: 1 },
		...{ rejectWithinHours: 24, placement: 'in-product' },
		legs: [leg('ostrel', 'packing', 3, 5, 'Ostrel Biologics'), leg('hollin', 'road, active box', 7, 5)],
		goods: [
			goods(
				['Vaccine, refrigerated, 10-dose vials', 'Vaccine, 10-dose vials, 60 a shipper'],
				[24, 12],
				1900,
				700
			)
		]
	}
} satisfies Record<string, Lane>;

/** The lanes into Harrow Mill. */
const mill = {
	'cv-berries': {
		...berries,
		...{ site: 'HM', supplier: 'coldbrook', carrier: 'quillane', mode: 'road', layout: 'american', dock: 0 },
		legs: [
			leg('coldbrook', 'precooler', 6, 0.5, 'Coldbrook Vale packhouse'),
			leg('quillane', 'road', 30, 0.5)
		],
		goods: [goods(['Blueberries', 'Blueberries, 12 × 1 pt'], [720, 144], 26, 16)]
	},
	'cv-strawberries': {
		...berries,
		...{ site: 'HM', supplier: 'coldbrook', carrier: 'quillane', mode: 'road', layout: 'american', dock: 0 },
		legs: [
			leg('coldbrook', 'precooler', 4, 0.5, 'Coldbrook Vale packhouse'),
			leg('quillane', 'road', 22, 0.5)
		],
		goods: [goods(['Strawberries', 'Strawberries, 8 × 1 lb'], [540, 108], 19.5, 8)]
	},
	'jb-lettuce': {
		...{ site: 'HM', supplier: 'juniper', carrier: 'stonefield', mode: 'road', layout: 'american', dock: 1 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('juniper', 'cooler', 8, 1.5, 'Juniper Bench cooler'), leg('stonefield', 'road', 40, 1.5)],
		goods: [goods(['Lettuce, crisphead', 'Iceberg, 24 heads'], [800, 80], 22, 12)]
	},
	'jb-broccoli': {
		...{
			site: 'HM',
			supplier: 'juniper',
			carrier: 'stonefield',
			mode: 'road',
			layout: 'with-humidity',
			dock: 1
		},
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('juniper', 'cooler', 6, 1, 'Juniper Bench cooler'), leg('stonefield', 'road', 38, 1)],
		goods: [goods(['Broccoli, crowns', 'Broccoli crowns, 20 lb'], [480, 48], 24.5, 16)]
	},
	'jb-tomatoes': {
		...{ site: 'HM', supplier: 'juniper', carrier: 'stonefield', mode: 'road', layout: 'american', dock: 2 },
		...{ rejectWithinHours: 12, placement: 'between-cases' },
		legs: [leg('juniper', 'ripening room', 6, 12, 'Juniper Bench cooler'), leg('stonefield', 'road', 26, 12)],
		goods: [goods(['Tomatoes, ripe', 'Tomatoes on the vine, 11 lb'], [640, 80], 17, 14)]
	},
	'ice-cream': {
		...{
			site: 'HM',
			supplier: 'fennward',
			carrier: 'quillane',
			mode: 'road',
			layout: 'json-nested',
			dock: 2
		},
		...{ rejectWithinHours: 24, placement: 'air' },
		legs: [
			leg('fennward', 'import store', 6, -22, 'Fennward import store'),
			leg('quillane', 'road', 18, -22)
		],
		goods: [goods(['Ice cream', 'Ice cream, 6 × 1 pt'], [360, 60], 31, 480)]
	}
} satisfies Record<string, Lane>;

export type LaneName = keyof typeof staithe | keyof typeof mill;

export const lanes: Record<LaneName, Lane> = { ...staithe, ...mill };
