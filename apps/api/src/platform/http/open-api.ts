import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule, type OpenAPIObject } from '@nestjs/swagger';

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
  return withProblems(document);
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

/** Pages at /api/docs to read and try the API; never in real use. */
export function serveApiDocuments(app: INestApplication): void {
  SwaggerModule.setup('docs', app, () => buildOpenApi(app), { useGlobalPrefix: true });
}

const uncapital = (word: string) => word.charAt(0).toLowerCase() + word.slice(1);
