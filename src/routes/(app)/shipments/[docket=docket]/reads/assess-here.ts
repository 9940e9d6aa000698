import type { Understanding } from '$lib/domain/ingest/ingestion';
import { assess, AssessmentRefusal } from '$lib/domain/receiving/assess';
import type { Trace } from '$lib/domain/trace/trace';
import type { DeviceInputs, DeviceLine, DeviceLogger } from '$lib/schemas/read';

/** What a file would mean for one line, worked out before it is sent. */
export interface LifeHere {
	serial: string;
	line: string;
	remainingHours: { value: number; low: number; high: number };
	neededHours: number;
	excursions: number;
	/** A freezing point or a food-safety ceiling was passed. */
	hasStop: boolean;
}

/** The logger a file is from: the one it names, else the only one still expected; null leaves it to a person. */
export function loggerOf(serial: string | null, loggers: readonly DeviceLogger[]): DeviceLogger | null {
	const named = loggers.find((logger) => logger.serial === serial);
	const only = serial === null && loggers.length === 1 ? loggers[0] : undefined;
	return named ?? only ?? null;
}

/** Life left of each line that the logger rode with, by the engine the server uses. */
export function assessHere(
	{ channels, temperature, declared }: Understanding,
	{ lines, loggers }: DeviceInputs
): LifeHere[] {
	const trace = channels[temperature]?.trace;
	const logger = loggerOf(declared.serial, loggers);
	if (!trace || !logger) return [];
	const riding = lines.filter(({ id, compartmentId }) =>
		logger.lineId === null ? compartmentId === logger.compartmentId : id === logger.lineId
	);
	return riding.flatMap((line) => lifeOf(line, logger, trace) ?? []);
}

function lifeOf(line: DeviceLine, logger: DeviceLogger, trace: Trace): LifeHere | null {
	const { spec, opening, handovers, neededHours } = line;
	const { accuracyCelsius, placement, serial } = logger;
	try {
		const facts = { spec, trace, accuracyCelsius, placement, opening, handovers, trims: [], neededHours };
		const { remainingHours, excursions, stops } = assess(facts);
		const { value, low, high } = remainingHours;
		const counts = { excursions: excursions.length, hasStop: stops.length > 0 };
		return { serial, line: line.name, remainingHours: { value, low, high }, neededHours, ...counts };
	} catch (error) {
		// Readings of another time than the journey say nothing about it; the server will say the same.
		if (error instanceof AssessmentRefusal) return null;
		throw error;
	}
}
