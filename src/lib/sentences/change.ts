/** A change of the record as a sentence: field names and values as words, not as columns. */

export interface RecordedChange {
	readonly subject: string;
	readonly action: 'INSERT' | 'UPDATE' | 'DELETE';
	readonly before: Readonly<Record<string, unknown>> | null;
	readonly after: Readonly<Record<string, unknown>> | null;
}

/** What a table holds, as a person calls it. */
export const SUBJECT_WORDS: Readonly<Record<string, string>> = {
	yards: 'the yard',
	stands: 'a stand',
	boats: 'a boat',
	boat_painters: 'a painter of a boat',
	faces: 'a face',
	sheets: 'a sheet',
	jobs: 'a job',
	job_waits: 'what a job waits for',
	steps: 'a step',
	step_faces: 'a face of a step',
	step_painters: 'a painter of a step',
	memberships: 'a person of the yard',
	invitations: 'an invitation',
	absences: 'an absence',
	plans: 'a plan',
	plan_steps: 'a step of a plan',
	plan_answers: 'an answer to a plan',
	files: 'a file'
};

/** Columns whose name is not what a person calls them. */
const FIELD_WORDS: Readonly<Record<string, string>> = {
	owner_id: 'owner',
	stand_id: 'stand',
	sheet_id: 'sheet',
	user_id: 'person',
	hauled_on: 'hauled on',
	launch_by: 'launch by',
	pinned_at: 'fixed start',
	started_at: 'begun',
	finished_at: 'finished',
	duration_minutes: 'minutes of work',
	lift_gust: 'wind limit of the hoist',
	high_wind_gust: 'gust of a high-wind day',
	loose_sand: 'loose sand',
	work_hours: 'working hours'
};

const VALUE_WORDS: Readonly<Record<string, string>> = {
	underWay: 'under way',
	driveLeg: 'drive leg',
	coredGrp: 'cored glass fibre',
	grp: 'glass fibre',
	nonSkid: 'non-skid'
};

const MOST_FIELDS = 4;
const UUID = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;

export const fieldWords = (column: string): string =>
	FIELD_WORDS[column] ?? column.replaceAll('_', ' ');

/** A value in words; null where it says nothing to a person, as an id does not. */
function valueWords(value: unknown): string | null {
	if (value === null || value === undefined || value === '') return 'nothing';
	if (typeof value === 'boolean') return value ? 'yes' : 'no';
	if (typeof value === 'number') return String(value);
	if (typeof value !== 'string' || UUID.test(value)) return null;
	const words = VALUE_WORDS[value] ?? value;
	return words.length > 60 ? `${words.slice(0, 60)}…` : words;
}

function fieldSentence(column: string, was: unknown, is: unknown): string {
	const field = fieldWords(column);
	const [from, to] = [valueWords(was), valueWords(is)];
	return from === null || to === null ? field : `${field} from ${from} to ${to}`;
}

/** What was done, without who did it: "changed a boat, Corncrake: heading from 10 to 20". */
export function changeSentence(
	{ subject, action, before, after }: RecordedChange,
	/** What the row is called where the change does not say. */
	called: string | null = null
): string {
	const what = SUBJECT_WORDS[subject] ?? subject.replaceAll('_', ' ');
	const whole = after ?? before ?? {};
	const name = [whole.name, whole.email, called].find((it) => typeof it === 'string') as
		string | undefined;
	const named = name === undefined ? what : `${what}, ${name}`;
	if (action === 'INSERT') return `added ${named}`;
	if (action === 'DELETE') return `took away ${named}`;
	const columns = [...new Set([...Object.keys(before ?? {}), ...Object.keys(after ?? {})])];
	const told = columns
		.slice(0, MOST_FIELDS)
		.map((column) => fieldSentence(column, before?.[column], after?.[column]));
	const more = columns.length - told.length;
	return `changed ${named}: ${told.join('; ')}${more > 0 ? `; and ${more} more` : ''}`;
}
