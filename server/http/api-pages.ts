import { createRequire } from 'node:module';
import { dirname } from 'node:path';
import express, { Router } from 'express';
import { ERROR_STATUS, ERROR_TITLE, type ErrorCode } from '../errors';
import type { Endpoint } from './endpoint';
import { openApiDocument } from './openapi';

// found, not imported: the package would load the whole browser program into this process
const SWAGGER_UI = dirname(createRequire(import.meta.url).resolve('swagger-ui-dist/package.json'));

/** The contract for programs at /openapi.json, for people at /docs; all of it works without the internet. */
export function apiPages(endpoints: readonly Endpoint[], publicUrl: string): Router {
  const router = Router();
  const document = openApiDocument(endpoints, publicUrl);
  router.get('/openapi.json', (_request, response) => {
    response.json(document);
  });
  router.get('/docs', (_request, response) => {
    response.type('html').send(DOCS_PAGE);
  });
  router.get('/docs/init.js', (_request, response) => {
    response.type('js').send(DOCS_SCRIPT);
  });
  router.get('/docs/problems', (_request, response) => {
    response.type('html').send(problemsPage());
  });
  router.use('/docs', express.static(SWAGGER_UI, { index: false, redirect: false }));
  return router;
}

const page = (title: string, head: string, body: string): string => `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${title}</title>
${head}
</head>
<body>
${body}
</body>
</html>
`;

const DOCS_PAGE = page(
  'Layerwell: HTTP interface',
  '<link rel="stylesheet" href="/api/docs/swagger-ui.css">',
  `<div id="docs"></div>
<script src="/api/docs/swagger-ui-bundle.js"></script>
<script src="/api/docs/init.js"></script>`,
);

// a file of its own, because the content security policy allows no script inside a page
const DOCS_SCRIPT = `const dark = matchMedia('(prefers-color-scheme: dark)');
const show = () => document.documentElement.classList.toggle('dark-mode', dark.matches);
dark.addEventListener('change', show);
show();
SwaggerUIBundle({ url: '/api/openapi.json', dom_id: '#docs', deepLinking: true });
`;

const WHAT_TO_DO: Record<ErrorCode, string> = {
  'bad-request': 'Correct the form of the request: its JSON, its file part or its headers.',
  invalid:
    'Correct the values that <code>faults</code> names; each tells where, what was found and what is allowed.',
  unauthenticated: 'Sign in; a session ends after its time or when it is signed out.',
  forbidden: 'Ask a lead of the survey for another role, or send the change from a page of this server.',
  'not-found': 'Check the address. What you are no member of is not found either.',
  conflict:
    'Compare your change with <code>current</code>, the row as it now stands, and send it again with that version.',
  'already-exists': 'Choose another name or address.',
  'wrong-state': 'Look at the state of the thing; the sentence says what would have to come first.',
  'version-required': 'Send the ETag of the row you edited in If-Match.',
  'too-large': 'Send less; the sentence says how much is taken.',
  'unsupported-media': 'Send JSON in UTF-8, or the kind of file that the sentence names.',
  'rate-limited': 'Wait for the seconds in Retry-After.',
  unavailable: 'Try again in a moment; nothing was lost.',
  internal: 'Try again; if it stays, tell the administrator the requestId.',
};

function problemsPage(): string {
  const items = (Object.keys(ERROR_STATUS) as ErrorCode[]).map(
    (code) => `<h2 id="${code}"><code>${code}</code>, status ${ERROR_STATUS[code]}</h2>
<p>${ERROR_TITLE[code]}. ${WHAT_TO_DO[code]}</p>`,
  );
  return page(
    'Layerwell: problem codes',
    `<style>
:root{color-scheme:light dark;background:light-dark(#f7f5f0,#141a1e);color:light-dark(#1d2a33,#ebe6db)}
body{font:16px/1.5 "IBM Plex Sans",sans-serif;max-width:44rem;margin:2rem auto;padding:0 1rem}
</style>`,
    `<h1>Problem codes</h1>
<p>Every failure is a problem detail (RFC 9457); its <code>code</code> is one of these.</p>
${items.join('\n')}`,
  );
}
