import fc from 'fast-check';

/** A table of two to six rows, any temperatures rising, any times from a minute to a month. */
export const tables = fc
	.uniqueArray(fc.integer({ min: -5, max: 45 }), { minLength: 2, maxLength: 6 })
	.chain((celsius) =>
		fc
			.array(fc.double({ min: 1, max: 43_200, noNaN: true }), {
				minLength: celsius.length,
				maxLength: celsius.length
			})
			.map((minutes) =>
				[...celsius].sort((a, b) => a - b).map((at, i): [number, number] => [at, minutes[i]])
			)
	);
