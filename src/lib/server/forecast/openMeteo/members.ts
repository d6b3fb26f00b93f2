import type { Hourly, Member } from '../../../engine';
import { toCanonical } from '../canonical';
import { readHours } from './answer';
import { FORECAST_VARIABLES, MEMBER_VARIABLES } from './variables';

const MEMBER_SUFFIX = /^(.+)_member(\d{2,})$/;

/** Canonical name and unit by Open-Meteo's name. */
const ASKED = new Map(
	MEMBER_VARIABLES.map((canonical) => {
		const [name, unit] = FORECAST_VARIABLES[canonical];
		return [name as string, { canonical, unit }] as const;
	})
);
export const MEMBER_NAMES = [...ASKED.keys()];

/** The control run has the plain name, member n the suffix `_member01` …; 0 is the control. */
function split(name: string): { base: string; member: number } {
	const match = MEMBER_SUFFIX.exec(name);
	return match === null
		? { base: name, member: 0 }
		: { base: match[1] ?? name, member: Number(match[2]) };
}

/**
 * The members of an ensemble answer on the hours of the main forecast; an hour that the ensemble
 * does not have is null. The control counts as a member.
 *
 * @param time - hours of the main forecast, UTC epoch seconds
 * @throws {ForecastTrouble} when the answer is not sound; it is refused whole
 */
export function readMembers(body: unknown, provider: string, time: number[]): Member[] {
	const wanted = [...ASKED].map(([name, { unit }]) => [name, unit] as const);
	const hours = readHours(
		body,
		provider,
		wanted,
		(name) => ASKED.get(split(name).base)?.unit ?? null
	);

	const members = new Map<number, Member>();
	for (const [name, values] of hours.series) {
		const { base, member } = split(name);
		const asked = ASKED.get(base);
		if (asked === undefined) continue;
		const series = members.get(member) ?? {};
		series[asked.canonical] = values;
		members.set(member, series);
	}
	const ordered = [...members.entries()].sort(([a], [b]) => a - b).map(([, series]) => series);
	const sound = toCanonical(
		{ issuedAt: 0, hourly: { time: hours.time }, members: ordered },
		provider
	);
	return (sound.members ?? []).map((member) => onHours(member, sound.hourly.time, time));
}

function onHours(member: Member, from: Hourly['time'], to: Hourly['time']): Member {
	const index = new Map(from.map((t, i) => [t, i]));
	const moved: Member = {};
	for (const canonical of MEMBER_VARIABLES) {
		const values = member[canonical];
		if (values === undefined) continue;
		moved[canonical] = to.map((t) => {
			const i = index.get(t);
			return i === undefined ? null : (values[i] ?? null);
		});
	}
	return moved;
}
