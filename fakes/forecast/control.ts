import type { IncomingMessage, ServerResponse } from 'node:http';
import { z } from 'zod';
import { faultsSchema, type Faults } from './faults';
import { scenarioSchema, type Scenario } from './scenario';

/** What can be changed in a running fake; what is left out stays. */
const changeSchema = z.strictObject({
	scenario: scenarioSchema.optional(),
	/** Replaces all faults. */
	faults: faultsSchema.optional(),
	/** UTC epoch seconds to stand still at; null: the machine's clock. */
	now: z.int().nullable().optional()
});

interface Controlled {
	setScenario(scenario: Scenario): void;
	setFaults(faults: Faults): void;
	setNow(now: number | null): void;
}

/** `GET /_control` shows, `POST /_control` changes; both answer with the state. */
export async function handleControl(
	request: IncomingMessage,
	response: ServerResponse,
	fake: Controlled,
	state: () => unknown
): Promise<void> {
	const reply = (status: number, body: unknown) => {
		response.writeHead(status, { 'content-type': 'application/json; charset=utf-8' });
		response.end(JSON.stringify(body));
	};
	if (request.method === 'POST') {
		let text = '';
		for await (const chunk of request) text += String(chunk);
		try {
			const change = changeSchema.parse(JSON.parse(text));
			if (change.now !== undefined) fake.setNow(change.now);
			if (change.scenario !== undefined) fake.setScenario(change.scenario);
			if (change.faults !== undefined) fake.setFaults(change.faults);
		} catch (error) {
			return reply(400, { error: error instanceof Error ? error.message : String(error) });
		}
	}
	reply(200, state());
}
