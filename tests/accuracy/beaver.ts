// Source: Reynolds (1994), "Time-series analyses of beaver body temperatures", as R 4.2 datasets::beaver1: body
// temperature in °C every 10 min from 1990-12-12 08:40, read off a real transmitter; the 22:20 reading is missing.
// Generated: from the printed series of the R data set, in its order.
const printed = `
36.33 36.34 36.35 36.42 36.55 36.69 36.71 36.75 36.81 36.88 36.89 36.91 36.85 36.89 36.89 36.67 36.50 36.74 36.77
36.76 36.78 36.82 36.89 36.99 36.92 36.99 36.89 36.94 36.92 36.97 36.91 36.79 36.77 36.69 36.62 36.54 36.55 36.67
36.69 36.62 36.64 36.59 36.65 36.75 36.80 36.81 36.87 36.87 36.89 36.94 36.98 36.95 37.00 37.07 37.05 37.00 36.95
37.00 36.94 36.88 36.93 36.98 36.97 36.85 36.92 36.99 37.01 37.10 37.09 37.02 36.96 36.84 36.87 36.85 36.85 36.87
36.89 36.86 36.91 37.53 37.23 37.20 37.25 37.20 37.21 37.24 37.10 37.20 37.18 36.93 36.83 36.93 36.83 36.80 36.75
36.71 36.73 36.75 36.72 36.76 36.70 36.82 36.88 36.94 36.79 36.78 36.80 36.82 36.84 36.86 36.88 36.93 36.97 37.15
`;
const readingsBeforeTheMissingOne = 82;

export const beaverCelsius: readonly number[] = printed.trim().split(/\s+/).map(Number);

export const beaverTimes: readonly number[] = beaverCelsius.map(
	(_, i) => Date.UTC(1990, 11, 12, 8, 40) + 600_000 * (i < readingsBeforeTheMissingOne ? i : i + 1)
);
