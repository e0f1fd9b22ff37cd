/** The interface as an OpenAPI 3.1 page, made from the contract that the server parses with. */
import { z } from 'zod';
import { displayMediaType, metricsHeader, planesHeader } from '../contract/planes';
import { problemSchema } from '../contract/problem';
import type { Route } from '../contract/route';
import { routes } from '../contract/routes';

type Json = Record<string, unknown>;

const jsonSchemaOf = (schema: z.ZodType, io: 'input' | 'output'): Json => {
  const { $schema: _dialect, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any' });
  return rest;
};

/** The page for `version` of the product. */
export function describeInterface(version: string): Json {
  const paths: Record<string, Json> = {};
  for (const route of routes) {
    const path = route.path.replace(/:(\w+)/g, '{$1}');
    paths[path] = { ...paths[path], [route.method]: describeRoute(route) };
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Pickglass', version },
    paths,
    components: {
      schemas: { Problem: jsonSchemaOf(problemSchema, 'output') },
      securitySchemes: {
        session: { type: 'apiKey', in: 'cookie', name: 'pickglass_session' },
        scannerToken: { type: 'http', scheme: 'bearer' },
      },
    },
  };
}

function describeRoute(route: Route): Json {
  const parameters = [...describeParameters(route.params, 'path'), ...describeParameters(route.query, 'query')];
  const body = describeBody(route);
  return {
    summary: route.summary,
    ...describeAccess(route.access),
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(body ? { requestBody: { required: true, content: body } } : {}),
    responses: {
      [route.status]: describeAnswer(route),
      default: {
        description: 'A problem (RFC 9457)',
        content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
      },
    },
  };
}

function describeAccess(access: Route['access']): Json {
  if (access === 'anyone') return { security: [] };
  if (access === 'scanner') return { security: [{ scannerToken: [] }] };
  return { security: [{ session: [] }], 'x-roles': access };
}

function describeParameters(schema: z.ZodType, place: 'path' | 'query'): Json[] {
  const { properties = {}, required = [] } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' });
  return Object.entries(properties).map(([name, property]) => ({
    name,
    in: place,
    required: place === 'path' || required.includes(name),
    schema: property,
  }));
}

function describeBody(route: Route): Json | undefined {
  if (route.takes === 'multipart') {
    const files = { type: 'array', items: { type: 'string', format: 'binary' } };
    return { 'multipart/form-data': { schema: { type: 'object', required: ['files'], properties: { files } } } };
  }
  if (route.takes === 'multipart-dicom') {
    return { 'multipart/related; type="application/dicom"': { schema: { type: 'array', items: { type: 'string', format: 'binary' } } } };
  }
  const schema = jsonSchemaOf(route.body, 'input');
  const empty = schema.type === 'object' && Object.keys(schema.properties ?? {}).length === 0;
  return empty ? undefined : { 'application/json': { schema } };
}

function describeAnswer(route: Route): Json {
  if (route.answers === 'empty') return { description: 'Done' };
  if (route.answers === 'json' || route.answers === 'dicom-json') {
    const mediaType = route.answers === 'json' ? 'application/json' : 'application/dicom+json';
    return { description: route.summary, content: { [mediaType]: { schema: jsonSchemaOf(route.output, 'output') } } };
  }
  const bytes = { schema: { type: 'string', format: 'binary' } };
  return {
    description: `Typed planes one after the other, described by ${planesHeader} (and ${metricsHeader}), or a PNG picture`,
    content: route.path.endsWith('/thumbnail') ? { 'image/png': bytes } : { 'application/octet-stream': bytes, [displayMediaType]: bytes },
  };
}
