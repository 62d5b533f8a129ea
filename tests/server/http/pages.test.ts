import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import express from 'express';
import request from 'supertest';
import { afterAll, describe, expect, test } from 'vitest';
import { endpoints } from '../../../server/endpoints';
import { ERROR_STATUS } from '../../../server/errors';
import { clientPages } from '../../../server/http/client-pages';
import { createTestServer } from '../../setup/server';

const server = await createTestServer();

describe('pages of the interface for programs', () => {
  test('the OpenAPI text names every endpoint and every schema it points to', async () => {
    const answer = await request(server.app).get('/api/openapi.json');
    const document = answer.body as {
      openapi: string;
      paths: Record<string, Record<string, unknown>>;
      components: { schemas: Record<string, unknown> };
    };
    expect(document.openapi).toBe('3.1.0');
    for (const { method, path } of endpoints)
      expect(document.paths[`/api/v1${path.replace(/:(\w+)/g, '{$1}')}`]).toHaveProperty(method);
    const pointed = new Set(
      [...answer.text.matchAll(/"#\/components\/schemas\/([^"]+)"/g)].map((m) => m[1] ?? ''),
    );
    for (const name of pointed) expect(document.components.schemas).toHaveProperty(name);
    expect(pointed.size).toBeGreaterThan(20);
  });

  test('are readable without the internet and without a script in the page', async () => {
    const page = await request(server.app).get('/api/docs');
    expect(page.headers['content-security-policy']).toMatch(/script-src 'self';/);
    expect(page.text).not.toMatch(/https?:\/\/|<script>/);
    const named = [...page.text.matchAll(/(?:src|href)="([^"]+)"/g)].map((match) => match[1] ?? '');
    expect(named).toHaveLength(3);
    for (const path of named) expect((await request(server.app).get(path)).status).toBe(200);
  });

  test('explain every problem code at the address that problems point to', async () => {
    const page = await request(server.app).get('/api/docs/problems');
    for (const code of Object.keys(ERROR_STATUS)) expect(page.text).toContain(`id="${code}"`);
    const problem = (await server.nobody.get('/me')).body as { type: string };
    expect(problem.type).toBe('/api/docs/problems#unauthenticated');
  });
});

describe('pages of the client', () => {
  const folder = mkdtempSync(join(tmpdir(), 'client-'));
  mkdirSync(join(folder, 'assets'));
  writeFileSync(join(folder, 'assets/app-abc123.js'), 'export {};');
  writeFileSync(join(folder, 'favicon.svg'), '<svg/>');
  const built = express().use(clientPages(folder));
  const ask = (path: string, accept = 'text/html') => request(built).get(path).set('Accept', accept);
  afterAll(() => rmSync(folder, { recursive: true }));

  test('say plainly when they are not built', async () => {
    const answer = await ask('/');
    expect(answer.status).toBe(503);
    expect(answer.text).toContain('npm start');
    writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Layerwell</title>');
  });

  test('every address of the client answers with the page, which is never kept', async () => {
    for (const path of ['/', '/surveys/1', '/soundings/1/bench']) {
      const answer = await ask(path);
      expect(answer.status).toBe(200);
      expect(answer.text).toContain('<title>Layerwell</title>');
      expect(answer.headers['cache-control']).toBe('no-cache');
    }
  });

  test('hashed files may be kept for a year, other files for an hour', async () => {
    const hashed = await ask('/assets/app-abc123.js', '*/*');
    expect(hashed.headers['cache-control']).toBe('public, max-age=31536000, immutable');
    const icon = await ask('/favicon.svg', '*/*');
    expect(icon.headers['cache-control']).toBe('public, max-age=3600');
  });

  test('a file of an older build is not found, rather than the page in its place', async () => {
    expect((await ask('/assets/app-old.js', '*/*')).status).toBe(404);
    expect((await ask('/data.json', 'application/json')).status).toBe(404);
    expect((await request(built).post('/surveys')).status).toBe(404);
  });
});

test('headers keep pages from being framed and links from being passed on', async () => {
  const { headers } = await request(server.app).get('/healthz');
  expect(headers['x-frame-options']).toBe('SAMEORIGIN');
  expect(headers['referrer-policy']).toBe('no-referrer');
  expect(headers['x-content-type-options']).toBe('nosniff');
  expect(headers['x-powered-by']).toBeUndefined();
});

test('a secure address gives secure cookies', async () => {
  const secure = await createTestServer({ PUBLIC_URL: 'https://wells.test' });
  const user = await secure.createUser();
  expect(await secure.services.sessions.create(user.id, '')).toMatch(/; Secure/);
});
