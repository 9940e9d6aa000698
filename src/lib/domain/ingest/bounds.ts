/** What one upload may cost. Beyond these a file is refused with the bound named, never read in part. */
export const maxFileBytes = 50 * 1024 * 1024;
export const maxReadings = 5_000_000;
/** Of delimited text only: minified JSON is one line. */
export const maxLineChars = 64 * 1024;
export const maxJsonDepth = 64;
/** Brackets, commas and colons of a JSON text: two to three for each cell of a reading. */
export const maxJsonValues = 20_000_000;
/** Cells of a row, or sensors of a file: a column for each minute of a day is the widest table there is. */
export const maxColumns = 2048;
/** Rows times columns: 50 MB of text hold a quarter of it where each cell stands in the file. */
export const maxCells = 100_000_000;
/** Values with more decimals are rounded to these: no logger resolves 0.0001 °C. */
export const maxDecimals = 4;
