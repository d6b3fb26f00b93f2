import type { Finish, Material } from '../vocabulary';

/** What a face is made of, as its heat balance sees it. */
export interface MaterialDefaults {
	/** J/m²K of the whole thickness. */
	readonly heatCapacity: number;
	/** Nodes through the thickness: one, or two where one would lag by kelvins. */
	readonly nodes: 1 | 2;
	/** W/m²K between the two nodes; 0 with one. */
	readonly conductance: number;
	/** W/m²K to the air inside; 0 where both sides are outside. */
	readonly insideU: number;
}

/** Default conductance from a hull's skin to the air inside, W/m²K (default, no source). */
const HULL_TO_INSIDE = 3;

/**
 * Areal heat capacities from thickness, density and specific heat of the usual build: 8 mm GRP
 * laminate, cored deck skin, 5 mm steel, 5 mm aluminium, 25 mm timber, cast drive leg, keels.
 * Defaults, no source beyond that product; a yard edits them.
 */
export const MATERIAL_DEFAULTS: Readonly<Record<Material, MaterialDefaults>> = {
	grp: { heatCapacity: 14_000, nodes: 1, conductance: 0, insideU: HULL_TO_INSIDE },
	coredGrp: { heatCapacity: 5_400, nodes: 1, conductance: 0, insideU: HULL_TO_INSIDE },
	steel: { heatCapacity: 18_000, nodes: 1, conductance: 0, insideU: HULL_TO_INSIDE },
	aluminium: { heatCapacity: 12_000, nodes: 1, conductance: 0, insideU: HULL_TO_INSIDE },
	// 25 mm at 500 kg/m³ and 1600 J/kgK, 0.13 W/mK between the centres of two halves.
	timber: { heatCapacity: 20_000, nodes: 2, conductance: 10.4, insideU: HULL_TO_INSIDE },
	casting: { heatCapacity: 35_000, nodes: 1, conductance: 0, insideU: 0 },
	iron: { heatCapacity: 500_000, nodes: 1, conductance: 0, insideU: 0 },
	lead: { heatCapacity: 220_000, nodes: 1, conductance: 0, insideU: 0 }
};

/** Water a face holds before it runs off, mm (defaults, no source). */
export const RUN_OFF_DEPTH: Readonly<Record<Finish, number>> = {
	gloss: 0.1,
	matt: 0.15,
	nonSkid: 0.4
};

/** Film from which a face counts as wet, mm. */
export const WET_FILM = 0.01;
