/** Every kind of job and who does it. */
export function registerAllJobs(): void {
	// Kinds are registered here as their nouns come to stand.
}
