import {
	boatDocumentSchema,
	boatFaceSchema,
	boatPatchSchema,
	facePatchSchema,
	newFaceSchema,
	stayListSchema
} from '../boat';
import { yardDocumentSchema, yardPatchSchema } from '../yard/settings';
import { newStandSchema, standListSchema, standPatchSchema, standSchema } from '../yard/stands';
import {
	answer,
	BOAT,
	body,
	optional,
	parameter,
	problems,
	schemaOf,
	SIGNED_IN,
	SLUG,
	UUID,
	type Json,
	type Part
} from './parts';

const STAND = parameter('stand', 'path', 'The stand', UUID);
const FACE = parameter('face', 'path', 'The face', UUID);
const REMOVAL = [
	parameter('revision', 'query', 'The one that was seen', { type: 'integer' }),
	optional('settled', 'That what hangs on it may go too', { type: 'boolean' })
];
const GONE: Json = { 204: { description: 'Taken away' } };

const read = (operationId: string, summary: string, parameters: Json[], ok: Json): Json => ({
	operationId,
	summary,
	security: SIGNED_IN,
	parameters,
	responses: { 200: ok, ...problems(401, 404) }
});
const change = (
	operationId: string,
	summary: string,
	parameters: Json[],
	schema: string,
	responses: Json
): Json => ({
	operationId,
	summary,
	security: SIGNED_IN,
	parameters,
	requestBody: body(schema),
	responses: { ...responses, ...problems(400, 401, 403, 404, 409, 413, 415) }
});
const remove = (operationId: string, summary: string, parameters: Json[]): Json => ({
	operationId,
	summary,
	security: SIGNED_IN,
	parameters: [...parameters, ...REMOVAL],
	responses: { ...GONE, ...problems(400, 401, 403, 404, 409) }
});

/**
 * A yard's settings, its stands, and one boat with its faces and stays. A change carries the
 * revision it was drawn from; where another came first it is refused with 409 and says who.
 */
export const yardPart: Part = {
	paths: {
		'/yards/{slug}': {
			get: read(
				'readYard',
				'What the yard’s managers have settled',
				[SLUG],
				answer('The yard', 'Yard')
			),
			patch: change('changeYard', 'Change settings; what is not named stays', [SLUG], 'YardPatch', {
				200: answer('The yard as it is now', 'Yard'),
				...problems(503)
			})
		},
		'/yards/{slug}/stands': {
			get: read('stands', 'The stands in their order', [SLUG], answer('The stands', 'Stands')),
			post: change('addStand', 'Add a stand', [SLUG], 'NewStand', {
				201: answer('The stand', 'Stand')
			})
		},
		'/yards/{slug}/stands/{stand}': {
			patch: change('changeStand', 'Change a stand', [SLUG, STAND], 'StandPatch', {
				200: answer('The stand as it is now', 'Stand')
			}),
			delete: remove('removeStand', 'Take a stand away', [SLUG, STAND])
		},
		'/yards/{slug}/boats/{boat}': {
			get: read('readBoat', 'A boat with its faces', [SLUG, BOAT], answer('The boat', 'Boat')),
			patch: change(
				'changeBoat',
				'Change a boat; managers alone say whose it is, where it stands and how it heads',
				[SLUG, BOAT],
				'BoatPatch',
				{ 200: answer('The boat as it is now', 'Boat') }
			),
			delete: remove('removeBoat', 'Take a boat away with its jobs and logs', [SLUG, BOAT])
		},
		'/yards/{slug}/boats/{boat}/faces': {
			post: change('addFace', 'Add a face', [SLUG, BOAT], 'NewFace', {
				201: answer('The face', 'Face')
			})
		},
		'/yards/{slug}/boats/{boat}/faces/{face}': {
			patch: change('changeFace', 'Change a face', [SLUG, BOAT, FACE], 'FacePatch', {
				200: answer('The face as it is now', 'Face')
			}),
			delete: remove('removeFace', 'Take a face away', [SLUG, BOAT, FACE])
		},
		'/yards/{slug}/boats/{boat}/stays': {
			get: read(
				'staysOfBoat',
				'Where a boat stood, latest first',
				[SLUG, BOAT],
				answer('Its stays', 'Stays')
			)
		}
	},
	schemas: {
		Yard: schemaOf(yardDocumentSchema, 'output'),
		YardPatch: schemaOf(yardPatchSchema, 'input'),
		Stand: schemaOf(standSchema, 'output'),
		Stands: schemaOf(standListSchema, 'output'),
		NewStand: schemaOf(newStandSchema, 'input'),
		StandPatch: schemaOf(standPatchSchema, 'input'),
		Boat: schemaOf(boatDocumentSchema, 'output'),
		BoatPatch: schemaOf(boatPatchSchema, 'input'),
		Face: schemaOf(boatFaceSchema, 'output'),
		NewFace: schemaOf(newFaceSchema, 'input'),
		FacePatch: schemaOf(facePatchSchema, 'input'),
		Stays: schemaOf(stayListSchema, 'output')
	}
};
