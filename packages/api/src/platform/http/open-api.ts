import { createRequire } from 'node:module';
import { dirname } from 'node:path';
import express, { type Express } from 'express';
import * as z from 'zod';
import { problemSchema } from '@bookmatch/common/problems/problem';
import { needsKey, PREFIXES, type Route } from './route.js';

type Json = Record<string, unknown>;

/** The API's own description, OpenAPI 3.1, made from the routes and their contracts, and a page to read it. */
export function mountOpenApi(app: Express, routes: readonly Route[]): void {
  const document = describeRoutes(routes);
  app.get('/api/openapi.json', (_request, response) => {
    response.json(document);
  });
  const assets = dirname(createRequire(import.meta.url).resolve('swagger-ui-dist/package.json'));
  app.get('/api/docs/start.js', (_request, response) => {
    response.type('text/javascript').send("SwaggerUIBundle({ url: '/api/openapi.json', dom_id: '#page' });");
  });
  app.get('/api/docs', (_request, response) => {
    response.type('html').send(PAGE);
  });
  app.use('/api/docs', express.static(assets, { index: false, redirect: false }));
}

const PAGE = `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Bookmatch API</title>
<link rel="stylesheet" href="/api/docs/swagger-ui.css"></head>
<body><div id="page"></div><script src="/api/docs/swagger-ui-bundle.js"></script><script src="/api/docs/start.js"></script></body></html>`;

export function describeRoutes(routes: readonly Route[]): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = (PREFIXES[route.kind] + route.path).replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: operation(route, path) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Bookmatch', version: '0.1.0' },
    paths,
    components: { schemas: { Problem: schemaOf(problemSchema, 'output') } },
  };
}

function operation(route: Route, path: string): Json {
  return {
    summary: route.summary,
    description: permission(route),
    parameters: [...pathParameters(path), ...queryParameters(route), ...headerParameters(route)],
    ...(route.body
      ? { requestBody: { required: true, content: jsonContent(schemaOf(route.body, 'input')) } }
      : {}),
    responses: {
      [String(route.status ?? (route.answer ? 200 : 204))]: {
        description: 'Done',
        ...(route.answer ? { content: jsonContent(schemaOf(route.answer, 'output')) } : {}),
      },
      default: {
        description: 'Refused',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

function permission(route: Route): string {
  if (route.kind === 'shop') return `Needs ${route.allow[0]} on ${route.allow[1]}.`;
  if (route.kind === 'link') return 'Needs a valid link of a customer.';
  return route.allow === 'anyone' ? 'Open to anyone.' : 'Needs a signed-in person.';
}

function pathParameters(path: string): Json[] {
  return [...path.matchAll(/\{(\w+)\}/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string', ...(name === 'token' ? {} : { format: 'uuid' }) },
  }));
}

function queryParameters(route: Route): Json[] {
  if (!route.query) return [];
  const schema = schemaOf(route.query, 'input') as { properties?: Record<string, Json>; required?: string[] };
  return Object.entries(schema.properties ?? {}).map(([name, property]) => ({
    name,
    in: 'query',
    required: schema.required?.includes(name) ?? false,
    schema: property,
  }));
}

function headerParameters(route: Route): Json[] {
  const header = (name: string) => ({ name, in: 'header', required: true, schema: { type: 'string' } });
  return [
    ...(route.method === 'get' ? [] : [header('X-CSRF-Token')]),
    ...(needsKey(route) ? [header('Idempotency-Key')] : []),
    ...('versioned' in route && route.versioned ? [header('If-Match')] : []),
  ];
}

const jsonContent = (schema: Json) => ({ 'application/json': { schema } });

function schemaOf(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' }) as Json;
  return rest;
}
