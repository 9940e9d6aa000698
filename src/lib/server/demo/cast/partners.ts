/** A firm of the demo; all are invented. */
export interface DemoPartner {
	key: string;
	name: string;
	duty: 'supplier' | 'carrier';
	address: string;
	countryCode: string;
	/** Place before the top-level domain `.example`. */
	domain: string;
	/** Before the lots and the trailers. */
	prefix: string;
	contacts: readonly { name: string; duty: string; isNotified: boolean }[];
}

const quality = (name: string) => ({ name, duty: 'quality', isNotified: true });
const other = (name: string, duty: string) => ({ name, duty, isNotified: false });

function firm(
	duty: DemoPartner['duty'],
	key: string,
	name: string,
	[address, countryCode]: readonly [string, string],
	prefix: string,
	contacts: DemoPartner['contacts']
): DemoPartner {
	const domain = name.toLowerCase().replace(/ and | /g, '-');
	return { key, name, duty, address, countryCode, domain, prefix, contacts };
}

export const suppliers: readonly DemoPartner[] = [
	firm(
		'supplier',
		'olmarisa',
		'Olmarisa Berry Growers',
		['Packhouse 2, Camino del Alcor, Olmarisa', 'ES'],
		'OB',
		[quality('Lucía Ferrán'), other('Mateo Rubal', 'sales')]
	),
	firm('supplier', 'tessil', 'Tessil Hill Fruit', ['Cold Lane 4, Tessil', 'GB'], 'TH', [
		quality('Owen Tarrick')
	]),
	firm('supplier', 'lowfen', 'Lowfen Leaf Growers', ['Drove 11, Lowfen', 'GB'], 'LF', [
		quality('Maud Ellery'),
		other('Piers Dunmoor', 'dispatch')
	]),
	firm('supplier', 'brinnoch', 'Brinnoch Fish Hall', ['Harbour Head 1, Brinnoch', 'GB'], 'BF', [
		quality('Isla Kerrow')
	]),
	firm('supplier', 'skerrin', 'Skerrin Smokehouse', ['Kiln Yard, Skerrin', 'GB'], 'SK', [
		quality('Fergus Naill')
	]),
	firm('supplier', 'noorderkwel', 'Noorderkwel Bulbs', ['Kwelweg 80, Noorderkwel', 'NL'], 'NK', [
		quality('Tjitske Haven')
	]),
	firm('supplier', 'heidsand', 'Heidsand Asparagus', ['Sandweg 3, Heidsand', 'DE'], 'HS', [
		quality('Jost Reimann')
	]),
	firm('supplier', 'vesterglas', 'Vesterglas Growers', ['Glasvej 14, Vesterglas', 'DK'], 'VG', [
		quality('Mette Brandal')
	]),
	firm('supplier', 'rocanegra', 'Rocanegra Vines', ['Finca 9, Rocanegra', 'ES'], 'RV', [
		quality('Inés Torralba')
	]),
	firm('supplier', 'meadowcote', 'Meadowcote Dairy', ['Vale Road 30, Meadowcote', 'GB'], 'MD', [
		quality('Ruan Pellick')
	]),
	firm('supplier', 'fennward', 'Fennward Frozen', ['Store 6, Fennward', 'NL'], 'FF', [
		quality('Anouk Verdam')
	]),
	firm('supplier', 'ostrel', 'Ostrel Biologics', ['Block C, Ostrel Park', 'BE'], 'OX', [
		quality('Dr Noor Callant')
	]),
	firm('supplier', 'coldbrook', 'Coldbrook Vale Berries', ['118 Coldbrook Vale Rd', 'US'], 'CV', [
		quality('Dana Whitlow')
	]),
	firm('supplier', 'juniper', 'Juniper Bench Produce', ['4200 Bench Line Rd', 'US'], 'JB', [
		quality('Cal Ordway')
	])
];

export const carriers: readonly DemoPartner[] = [
	firm('carrier', 'anselm', 'Anselm Road Transport', ['Ring 55, Anselm', 'FR'], 'AR', [
		other('Gilles Morvan', 'claims')
	]),
	firm('carrier', 'bexcombe', 'Bexcombe Haulage', ['Depot 2, Bexcombe', 'GB'], 'BX', [
		other('Wendy Stroud', 'claims')
	]),
	firm('carrier', 'wade', 'Wade and Tully', ['Mill Bank 7, Tully', 'GB'], 'WT', [
		other('Sid Tully', 'traffic')
	]),
	firm('carrier', 'lanyard', 'Lanyard Freight', ['Quay Street 19, Lanyard', 'GB'], 'LN', [
		other('Petra Voss', 'claims')
	]),
	firm('carrier', 'hollin', 'Hollin Cold Haul', ['Hollin Park 1', 'NL'], 'HC', [
		other('Bram Stoop', 'traffic')
	]),
	firm('carrier', 'trascoll', 'Trascoll Freight', ['Polígono 6, Trascoll', 'ES'], 'TR', [
		other('Nuria Balmes', 'claims')
	]),
	firm('carrier', 'merrow', 'Merrow Line', ['Ferry Terminal, Merrow', 'IE'], 'ML', [
		other('Declan Foy', 'cargo claims')
	]),
	firm('carrier', 'sarn', 'Sarn Quay Cold Store', ['Sarn Quay 8', 'GB'], 'SQ', [
		other('Hazel Prout', 'stock')
	]),
	firm('carrier', 'quillane', 'Quillane Refrigerated', ['900 Dray St, Quillane', 'US'], 'QR', [
		other('Marcus Hale', 'claims')
	]),
	firm('carrier', 'stonefield', 'Stonefield Cartage', ['77 Stonefield Ave', 'US'], 'SC', [
		other('Rita Bolan', 'dispatch')
	])
];
