/** The application's name and version as sent to providers. */
const APPLICATION = 'Yardglass/0.1';

/**
 * Identifies this installation to a provider, as "application/version contact": MET Norway's terms
 * ask for a name and a way to reach whoever runs it, and block what hides.
 *
 * @param contact - an e-mail address or a web page; may be empty
 */
export function userAgent(contact: string): string {
	// Header values are printable ASCII; anything else would make the request throw.
	const printable = contact.replace(/[^\x20-\x7e]/g, '').trim();
	return printable === '' ? APPLICATION : `${APPLICATION} ${printable}`;
}
