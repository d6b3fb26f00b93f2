import type { ShelterName } from '../../vocabulary';
import type { Shelter, ShelterFactors } from './face';

/** Presets of what a shelter does to the weather at a face. Rough, no source; a yard edits them. */
export const SHELTER_FACTORS: Readonly<Record<ShelterName, ShelterFactors>> = {
	open: { wind: 1, sun: 1, sky: 1, rain: false, dust: false, heat: 0, vapour: 0 },
	lee: { wind: 0.5, sun: 1, sky: 1, rain: false, dust: false, heat: 0, vapour: 0 },
	tarp: { wind: 0.4, sun: 0.3, sky: 0.3, rain: true, dust: false, heat: 0, vapour: 0 },
	tent: { wind: 0.2, sun: 0.4, sky: 0.15, rain: true, dust: true, heat: 0, sunHeat: 3, vapour: 0 },
	heatedTent: { wind: 0.2, sun: 0.4, sky: 0.15, rain: true, dust: true, heat: 8, vapour: 0 },
	shed: { wind: 0.1, sun: 0, sky: 0, rain: true, dust: true, heat: 0, vapour: 0 }
};

/** The factors of a shelter, named or given. */
export function shelterFactors(shelter: Shelter): ShelterFactors {
	return typeof shelter === 'string' ? SHELTER_FACTORS[shelter] : shelter;
}
