import { createConfig, lintFromString } from '@redocly/openapi-core';
import { describe, expect, it } from 'vitest';
import { routes } from '#shared/contracts/routes.ts';
import { openApiDocument } from './open-api.ts';

const document = openApiDocument(routes, { version: '1', url: 'http://127.0.0.1:4600' });

describe('the OpenAPI document', () => {
  it('is a valid OpenAPI 3.1 document', async () => {
    const config = await createConfig({ extends: ['minimal'], rules: { struct: 'error' } });
    const problems = await lintFromString({ source: JSON.stringify(document), config });
    expect(
      problems.filter(({ severity }) => severity === 'error').map(({ message }) => message),
    ).toEqual([]);
  });

  it('names every route of the contracts', () => {
    const operations = Object.values(
      document.paths as Record<string, Record<string, { operationId: string }>>,
    )
      .flatMap((path) => Object.values(path))
      .map(({ operationId }) => operationId);
    expect(operations.sort()).toEqual(Object.keys(routes).sort());
  });

  it('names schemas once and points to them', () => {
    const text = JSON.stringify(document);
    const schemas = Object.keys(
      (document.components as { schemas: Record<string, unknown> }).schemas,
    );
    expect(schemas).toEqual(expect.arrayContaining(['Me', 'Athlete', 'Clip', 'Side', 'Problem']));
    const pointed = [...text.matchAll(/#\/components\/schemas\/([A-Za-z0-9]+)/g)].map(
      ([, name]) => name,
    );
    expect(pointed.filter((name) => !schemas.includes(name ?? ''))).toEqual([]);
    expect(text).not.toContain('$defs');
  });

  it('describes a reading down to its angles', () => {
    const { schemas } = document.components as { schemas: Record<string, { properties?: object }> };
    expect(Object.keys(schemas.ReadingResult?.properties ?? {})).toContain('figures');
    expect(schemas.ReadingFigures?.properties).toHaveProperty('d.type', 'number');
    expect(schemas.RepResult?.properties).toHaveProperty('why.items.$ref');
  });

  it('says of a form where the file goes', () => {
    const text = JSON.stringify(
      (document.paths as Record<string, unknown>)['/api/visits/{id}/clips'],
    );
    expect(text).toContain('multipart/form-data');
    expect(text).toContain('"clip":{"type":"string","format":"binary"}');
  });
});
