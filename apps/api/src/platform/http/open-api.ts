import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule, type OpenAPIObject } from '@nestjs/swagger';
import { ID_SCHEMA } from '../dto/scalar-fields.js';
import { KEPT_TEXT } from '../dto/text-checks.js';

const PROBLEM = {
  type: 'object' as const,
  description: 'RFC 9457, with a stable code; errors names the fields that were wrong.',
  required: ['type', 'title', 'status', 'detail', 'code'],
  properties: {
    type: { type: 'string' },
    title: { type: 'string' },
    status: { type: 'integer' },
    detail: { type: 'string' },
    code: { type: 'string' },
    errors: {
      type: 'array',
      items: {
        type: 'object',
        required: ['field', 'message'],
        properties: { field: { type: 'string' }, message: { type: 'string' } },
      },
    },
  },
  additionalProperties: true,
};

const METHODS = ['get', 'put', 'post', 'delete', 'patch'] as const;

/** The OpenAPI document of the routes as they are; paths are without /api, which the document's server adds. */
export function buildOpenApi(app: INestApplication): OpenAPIObject {
  const head = new DocumentBuilder()
    .setTitle('Wetside')
    .setDescription('A shared darkroom’s chemistry: bottles, loads, dates, shelf and orders.')
    .setVersion('1')
    .addServer('/api')
    .build();
  const document = SwaggerModule.createDocument(app, head, {
    ignoreGlobalPrefix: true,
    operationIdFactory: (controller, method) =>
      `${uncapital(controller.replace(/Controller$/, ''))}.${method}`,
  });
  return withIds(closed(withProblems(document)));
}

/** Every operation can fail, and always in the same shape. */
function withProblems(document: OpenAPIObject): OpenAPIObject {
  const schema = { $ref: '#/components/schemas/Problem' };
  const response = { description: 'A problem document', content: { 'application/problem+json': { schema } } };
  for (const path of Object.values(document.paths)) {
    for (const method of METHODS) {
      const operation = path[method];
      if (operation) operation.responses['default'] ??= response;
    }
  }
  document.components = {
    ...document.components,
    schemas: { ...document.components?.schemas, Problem: PROBLEM },
  };
  return document;
}

/** A request with a field that is not known is refused, so its schemas say that there are no others. */
function closed(document: OpenAPIObject): OpenAPIObject {
  const schemas = document.components?.schemas ?? {};
  const seen = new Set<string>();
  const close = (part: unknown): void => {
    for (const name of namesIn(part)) {
      const schema = schemas[name];
      if (seen.has(name) || !schema || '$ref' in schema) continue;
      seen.add(name);
      schema.additionalProperties = false;
      close(schema);
    }
  };
  for (const path of Object.values(document.paths)) {
    for (const method of METHODS) close(path[method]?.requestBody);
  }
  return document;
}

const namesIn = (part: unknown): string[] =>
  [...(JSON.stringify(part) ?? '').matchAll(/"#\/components\/schemas\/(\w+)"/g)].map(([, name = '']) => name);

/** Path parameters that `IdParam` reads are named for an id; the darkroom's has a short name, too. */
function withIds(document: OpenAPIObject): OpenAPIObject {
  for (const path of Object.values(document.paths)) {
    for (const method of METHODS) {
      for (const parameter of path[method]?.parameters ?? []) {
        if ('$ref' in parameter || parameter.in !== 'path') continue;
        const isId = parameter.name.endsWith('Id') && parameter.name !== 'darkroomId';
        parameter.schema = isId ? { ...ID_SCHEMA } : { type: 'string', pattern: KEPT_TEXT };
      }
    }
  }
  return document;
}

/** Pages at /api/docs to read and try the API; never in real use. */
export function serveApiDocuments(app: INestApplication): void {
  SwaggerModule.setup('docs', app, () => buildOpenApi(app), { useGlobalPrefix: true });
}

const uncapital = (word: string) => word.charAt(0).toLowerCase() + word.slice(1);
