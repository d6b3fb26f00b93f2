import type { KeptMessage } from './message';

const escaped = (text: string): string =>
	text
		.replaceAll('&', '&amp;')
		.replaceAll('<', '&lt;')
		.replaceAll('>', '&gt;')
		.replaceAll('"', '&quot;');

const page = (title: string, body: string): string => `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escaped(title)}</title>
<style>body{font:16px/1.5 sans-serif;margin:2rem auto;max-width:60rem;padding:0 1rem}
td,th{text-align:left;padding:.3rem .8rem .3rem 0}iframe{width:100%;height:30rem;border:1px solid #777}
pre{white-space:pre-wrap;border:1px solid #777;padding:1rem}</style></head><body>${body}</body></html>`;

/** Every message kept, newest first. */
export function listPage(messages: readonly KeptMessage[]): string {
	const rows = [...messages]
		.reverse()
		.map(
			({ id, to, subject, receivedAt }) =>
				`<tr><td>${receivedAt}</td><td>${escaped(to.join(', '))}</td><td><a href="/message/${id}">${escaped(subject === '' ? '(no subject)' : subject)}</a></td></tr>`
		);
	const body =
		rows.length === 0
			? '<p>No mail has been sent yet.</p>'
			: `<table><tr><th>received</th><th>to</th><th>subject</th></tr>${rows.join('')}</table>`;
	return page('Mail kept', `<h1>Mail kept</h1>${body}`);
}

/** One message as HTML and as text, with its headers. */
export function messagePage(message: KeptMessage): string {
	const headers = message.headers
		.map(({ key, value }) => `${escaped(key)}: ${escaped(value)}`)
		.join('\n');
	const html =
		message.html === ''
			? ''
			: `<h2>HTML</h2><iframe sandbox title="The message as HTML" srcdoc="${escaped(message.html)}"></iframe>`;
	return page(
		message.subject,
		`<p><a href="/">All mail</a></p><h1>${escaped(message.subject)}</h1>${html}<h2>Text</h2><pre>${escaped(message.text)}</pre><h2>Headers</h2><pre>${headers}</pre>`
	);
}
