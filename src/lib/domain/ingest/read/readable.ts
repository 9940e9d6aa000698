import type { TemperatureUnit } from '../../units';
import type { Declared } from '../ingestion';
import type { Column } from '../layout/columns';
import type { Stated } from '../layout/preamble';
import type { Table } from '../layout/table';
import type { Timing } from '../layout/timing';
import type { Gathered, GatheredValues } from './gathered';
import type { Picked } from './pick-temperature';
import type { TimeAxis } from './time-axis';

/** Everything that is settled about a table once no question is left. */
export interface Readable {
	readonly table: Table;
	readonly encoding: string;
	readonly timing: Timing;
	readonly stated: Stated;
	readonly picked: Picked;
	readonly gathered: Gathered;
	readonly axis: TimeAxis;
	readonly declared: Declared;
	readonly column: Column;
	readonly values: GatheredValues;
	readonly unit: TemperatureUnit;
	readonly unitOf: (column: Column) => TemperatureUnit | null;
}
