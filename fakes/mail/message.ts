import PostalMime from 'postal-mime';

/** A message as it was kept. */
export interface KeptMessage {
	id: number;
	to: string[];
	from: string;
	subject: string;
	text: string;
	html: string;
	headers: { key: string; value: string }[];
	receivedAt: string;
}

/** Reads a message as it came over SMTP. */
export async function readMessage(id: number, to: string[], raw: Buffer): Promise<KeptMessage> {
	const mail = await PostalMime.parse(raw);
	return {
		id,
		to,
		from: mail.from?.address ?? '',
		subject: mail.subject ?? '',
		text: mail.text ?? '',
		html: mail.html ?? '',
		headers: mail.headers.map(({ key, value }) => ({ key, value })),
		receivedAt: new Date().toISOString()
	};
}
