/** What became of something asked of a job. A refusal says why, and at which field if at one. */
export type Outcome<Done = unknown> =
	| ({ readonly outcome: 'done' } & Done)
	| { readonly outcome: 'refused'; readonly why: string; readonly field?: string }
	/** Another change came first: what the revision is now, and who. */
	| { readonly outcome: 'stale'; readonly why: string; readonly revision: number }
	| { readonly outcome: 'gone' };

export const refused = (why: string, field?: string) =>
	({ outcome: 'refused', why, ...(field === undefined ? {} : { field }) }) as const;
