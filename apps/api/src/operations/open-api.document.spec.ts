import { ROUTES } from '@quarterpoise/dto';
import { describe, expect, it } from 'vitest';
import { openApiDocument } from './open-api.document.js';

describe('openApiDocument', () => {
  const { paths, components } = openApiDocument(ROUTES);
  const operations = Object.values(paths).flatMap((path) => Object.values(path as Record<string, any>));

  it('describes every route of the table once', () => {
    expect(operations.map((operation) => operation.operationId).toSorted()).toEqual(
      ROUTES.map((route) => route.id).toSorted(),
    );
  });

  it('names each parameter of an address in the address', () => {
    for (const [path, methods] of Object.entries(paths)) {
      const named = [...path.matchAll(/\{(\w+)\}/g)].map((match) => match[1]);
      for (const operation of Object.values(methods as Record<string, any>)) {
        const described = operation.parameters.filter((p: any) => p.in === 'path').map((p: any) => p.name);
        expect(described, path).toEqual(named);
      }
    }
  });

  it('asks for the token on every write behind the sign-in, and for the session', () => {
    const start = operations.find((operation) => operation.operationId === 'runs.start');
    expect(start.parameters).toContainEqual(expect.objectContaining({ name: 'x-csrf-token', required: true }));
    expect(start.security).toEqual([{ session: [] }]);
    const signIn = operations.find((operation) => operation.operationId === 'identity.sign-in');
    expect(signIn.security).toEqual([]);
  });

  it('describes the file of an upload', () => {
    const upload = operations.find((operation) => operation.operationId === 'imports.upload');
    const { schema } = upload.requestBody.content['multipart/form-data'];
    expect(schema.required).toContain('file');
    expect(schema.properties).toHaveProperty('statedRows');
  });

  it('gives every operation the problem document', () => {
    expect(components!.schemas).toHaveProperty('Problem');
    for (const operation of operations)
      expect(operation.responses.default.content).toHaveProperty('application/problem+json');
  });
});
