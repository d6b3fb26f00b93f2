import { z } from 'zod';
import { sheetSchema } from '../engine';

/** What a sheet is as JSON Schema (2020-12), for programs that write one. Units are the model's. */
export const SHEET_DOCUMENT = {
	...z.toJSONSchema(sheetSchema, { io: 'input' }),
	title: 'A coating’s data sheet',
	description:
		'What the tin is silent about is absent; a time of null says that the tin sets no limit. Rows of a table are [°C, minutes], their temperatures rising. Units: °C, minutes, %, µm, m²/L, L, m/s, kg/L.'
};
