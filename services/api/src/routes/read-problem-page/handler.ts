import { ProblemError, type ProblemKind, problemCatalogue } from '@spinassay/problems';
import type { Handler } from '../../http/answer.ts';

/** `GET /problems/{slug}`: what a kind of problem means and how to put it right. */
export const readProblemPage: Handler = async (request) => {
  const slug = String(request.params['id']);
  const kind = Object.values(problemCatalogue).find((candidate) => candidate.slug === slug);
  if (kind === undefined) throw new ProblemError({ slug: 'unknown-path', detail: 'No kind of problem has this name.' });
  const headers = {
    'Content-Type': 'text/html; charset=utf-8',
    'Content-Security-Policy': "default-src 'none'; frame-ancestors 'none'",
  };
  return { status: 200, headers, bytes: pageOf(kind) };
};

function pageOf({ slug, status, title, remedy, retryable }: ProblemKind): string {
  const again = retryable
    ? 'The same request may succeed later.'
    : 'The same request will fail again until it is changed.';
  return `<!doctype html>
<html lang="en">
<meta charset="utf-8">
<meta name="viewport" content="width=device-width">
<title>${escapeHtml(title)}</title>
<h1>${escapeHtml(title)}</h1>
<p>${escapeHtml(remedy)}</p>
<dl>
<dt>Name</dt><dd><code>${escapeHtml(slug)}</code></dd>
<dt>HTTP status</dt><dd>${status}</dd>
<dt>Trying again</dt><dd>${again}</dd>
</dl>
<p><a href="/docs/">The whole interface</a></p>
</html>
`;
}

/** The characters that HTML would take for its own. */
function escapeHtml(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}
