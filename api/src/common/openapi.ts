import { Problem } from '@furrowlight/shared/contract/common';
import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule, type OpenAPIObject } from '@nestjs/swagger';
import { z } from 'zod';
import { PRODUCT_VERSION } from '../config/product-version.js';

type Schemas = NonNullable<NonNullable<OpenAPIObject['components']>['schemas']>;

const METHODS = ['get', 'post', 'patch', 'put', 'delete'] as const;

/** JSON Schema 2020-12, the dialect of OpenAPI 3.1, without zod's own extras. */
function toJsonSchema(schema: unknown, io: 'input' | 'output') {
  if (!(schema instanceof z.ZodType)) return undefined;
  const json = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  delete json.$schema;
  const plain: Schemas[string] = JSON.parse(JSON.stringify(json));
  return { schema: plain };
}

const idempotencyKey = {
  name: 'Idempotency-Key',
  in: 'header',
  required: false,
  description: 'Repeating the request with the same key within 24 hours has no second effect.',
  schema: { type: 'string', minLength: 8, maxLength: 200 },
} as const;

const refusal = {
  description: 'Refused or failed: problem details (RFC 9457)',
  content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
};

/** What every operation has in common is said in one place instead of at each handler. */
function complete(document: OpenAPIObject): OpenAPIObject {
  const problem = toJsonSchema(Problem, 'output');
  document.components = {
    ...document.components,
    schemas: { ...document.components?.schemas, Problem: problem?.schema ?? {} },
  };
  for (const item of Object.values(document.paths)) {
    for (const method of METHODS) {
      const operation = item[method];
      if (!operation) continue;
      operation.responses['default'] = refusal;
      if (method === 'post' && operation.responses['201']) {
        operation.parameters = [...(operation.parameters ?? []), idempotencyKey];
      }
      if ('x-permission' in operation) operation.security = [{ session: [] }];
    }
  }
  return document;
}

/** The OpenAPI document, made from the routes and the contract's schemas. */
export function openApiDocument(app: INestApplication): OpenAPIObject {
  const base = new DocumentBuilder()
    .setOpenAPIVersion('3.1.0')
    .setTitle('Furrowlight')
    .setDescription(
      'The interface the pages of Furrowlight use. Sign in with POST /api/session; changing requests must come from the same origin and name row versions in If-Match.',
    )
    .setVersion(PRODUCT_VERSION)
    .addCookieAuth('furrowlight', { type: 'apiKey', in: 'cookie' }, 'session')
    .build();
  const document = SwaggerModule.createDocument(app, base, {
    operationIdFactory: (controller, method) =>
      `${controller.replace(/Controller$/, '')}.${method}`,
    standardSchemaConverter: (schema, { schemaType }) => toJsonSchema(schema, schemaType),
  });
  return complete(document);
}

/** Pages to read and try the interface at /api/docs. */
export function serveDocs(app: INestApplication): void {
  SwaggerModule.setup('api/docs', app, () => openApiDocument(app), {
    jsonDocumentUrl: 'api/docs/openapi.json',
    raw: ['json'],
    customSiteTitle: 'Furrowlight API',
  });
}
