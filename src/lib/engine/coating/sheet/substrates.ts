import { MATERIALS } from '../../vocabulary';

/** What a coating may lie on: the materials of faces, and bronze for propellers and shafts. */
export const SUBSTRATES = [...MATERIALS, 'bronze'] as const;
export type Substrate = (typeof SUBSTRATES)[number];

/** Drive legs and outdrives are cast in aluminium alloy (common practice). */
export const isAluminium = (substrate: Substrate): boolean =>
	substrate === 'aluminium' || substrate === 'casting';

export const isMetal = (substrate: Substrate): boolean =>
	isAluminium(substrate) || ['steel', 'iron', 'lead', 'bronze'].includes(substrate);
